import type { TestDatabase } from '@holdwater/backend/testing/test-database.js';
import { connectAsAdmin, nameOf } from './owner-connection.js';

/** Every so many answers the connections are cut. */
const answersBetweenCuts = 5;
/** After so many answers the database is away altogether, until so many requests were told so. */
const answersBeforeAway = 20;
const busyWhileAway = 6;

export interface DatabaseStorm {
  /** How often connections were cut, and how many requests were told that the server is busy. */
  readonly cuts: number;
  readonly busyAnswers: number;
  /** To be told of every answer, so that the storm keeps pace with the load, on a slow machine as on a fast one. */
  answered(isBusy: boolean): Promise<void>;
  /** The database is well again; may be called twice. */
  end(): Promise<void>;
}

/**
 * What a server sees of a database that restarts: its connections end in the middle of whatever they do (SQLSTATE 57P01), and for a
 * while no new one is let in. The cluster itself goes on, as other tests use it too.
 */
export async function startDatabaseStorm(database: TestDatabase): Promise<DatabaseStorm> {
  const admin = await connectAsAdmin();
  const name = nameOf(database);
  let answers = 0;
  let cuts = 0;
  let busyAnswers = 0;
  let busyAtAway: number | null = null;
  let hasBeenAway = false;
  let hasEnded = false;
  // one step at a time, whichever of the askers brings it on
  let queue: Promise<unknown> = Promise.resolve();

  const cut = async () => {
    const ended = await admin.rows(
      'SELECT pg_terminate_backend(pid) FROM pg_stat_activity WHERE datname = $1 AND pid <> pg_backend_pid()',
      [name],
    );
    if (ended.length > 0) cuts += 1;
  };
  const letIn = (isLetIn: boolean) => admin.rows(`ALTER DATABASE "${name}" ALLOW_CONNECTIONS ${isLetIn}`);
  const act = async () => {
    if (!hasBeenAway && answers >= answersBeforeAway) {
      hasBeenAway = true;
      busyAtAway = busyAnswers;
      await letIn(false);
      await cut();
    } else if (busyAtAway !== null && busyAnswers >= busyAtAway + busyWhileAway) {
      busyAtAway = null;
      await letIn(true);
    } else if (busyAtAway === null && answers % answersBetweenCuts === 0) {
      await cut();
    }
  };
  return {
    get cuts() {
      return cuts;
    },
    get busyAnswers() {
      return busyAnswers;
    },
    answered: async (isBusy) => {
      answers += 1;
      if (isBusy) busyAnswers += 1;
      queue = queue.then(() => (hasEnded ? undefined : act()));
      await queue;
    },
    end: async () => {
      if (hasEnded) return;
      hasEnded = true;
      // a step that went wrong has been told to its asker; the database is let in again all the same
      await queue.catch(() => undefined);
      await letIn(true);
      await admin.close();
    },
  };
}
