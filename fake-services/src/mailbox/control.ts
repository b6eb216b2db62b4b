export const mailboxModes = ['accept', 'refuse-connections', 'temporary-failure', 'reject-recipient', 'slow'] as const;

export type MailboxMode = (typeof mailboxModes)[number];

/** How the SMTP side behaves, for tests of what the product does then. */
export interface Scenario {
  mode: MailboxMode;
  /** Addresses it is about, in lower case. Empty means everybody, but for `reject-recipient`, which needs them. */
  recipients: string[];
  /** `slow` only: time from the end of the mail to the answer, in milliseconds. */
  delayMs: number;
}

/** A scenario that cannot be understood; the message says what is wrong with it. */
export class ScenarioError extends Error {}

const defaultDelayMs = 2_000;
const longestDelayMs = 10 * 60_000;

/** Holds the scenario in force. A restart begins with `accept`. */
export class Control {
  #scenario: Scenario = { mode: 'accept', recipients: [], delayMs: 0 };

  get scenario(): Scenario {
    return this.#scenario;
  }

  /** @throws ScenarioError, the scenario in force stays */
  set(wanted: unknown): Scenario {
    this.#scenario = readScenario(wanted);
    return this.#scenario;
  }

  /** Whether the mode is in force for a mail to these recipients. */
  isFor(mode: MailboxMode, recipients: string[]): boolean {
    const { mode: current, recipients: named } = this.#scenario;
    if (current !== mode) return false;
    return named.length === 0 || recipients.some((address) => named.includes(address.toLowerCase()));
  }
}

function readScenario(wanted: unknown): Scenario {
  if (typeof wanted !== 'object' || wanted === null || Array.isArray(wanted)) {
    throw new ScenarioError('Send an object such as { "mode": "accept" }.');
  }
  const { mode, recipients, delayMs } = wanted as Record<string, unknown>;
  const known = mailboxModes.find((each) => each === mode);
  if (!known) throw new ScenarioError(`"mode" must be one of: ${mailboxModes.join(', ')}.`);
  const addresses = readRecipients(recipients);
  if (known === 'reject-recipient' && addresses.length === 0) {
    throw new ScenarioError('"reject-recipient" needs "recipients": the addresses to reject.');
  }
  return { mode: known, recipients: addresses, delayMs: known === 'slow' ? readDelay(delayMs) : 0 };
}

function readRecipients(recipients: unknown): string[] {
  if (recipients === undefined) return [];
  if (!Array.isArray(recipients) || !recipients.every((each): each is string => typeof each === 'string')) {
    throw new ScenarioError('"recipients" must be a list of addresses.');
  }
  return recipients.map((address) => address.trim().toLowerCase());
}

function readDelay(delayMs: unknown): number {
  if (delayMs === undefined) return defaultDelayMs;
  if (typeof delayMs !== 'number' || !(delayMs >= 0 && delayMs <= longestDelayMs)) {
    throw new ScenarioError(`"delayMs" must be a number from 0 to ${longestDelayMs}.`);
  }
  return delayMs;
}
