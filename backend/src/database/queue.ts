/** Where pg-boss keeps its tables. */
export const queueSchema = 'queue';
/** The queue that wakes the outbox; what is due stands in our own tables. */
export const outboxQueue = 'outbox-wake';
