import pg from 'pg';

type Callback = (error: Error | undefined, client: pg.PoolClient | undefined, release: (why?: boolean) => void) => void;

/**
 * The pool the sockets' adapter listens through. The adapter takes one client out and keeps it, but neither hears its errors, which would
 * end the process, nor gives it back when its connection is lost, which would use the pool up, restart by restart. Both are done here.
 */
export class ListeningPool extends pg.Pool {
  private listener: pg.PoolClient | null = null;

  constructor(config: pg.PoolConfig) {
    super(config);
    // from the first moment: the end that follows an error is what is acted upon
    this.on('connect', (client) => client.on('error', () => undefined));
    this.on('release', (_error, client) => {
      if (this.listener === client) this.listener = null;
    });
  }

  /**
   * Ends with the listener given back, whoever had it: the adapter gives it back only once it listens, and a pool waits for every client that
   * is out. A server stopped right after its start would not end.
   */
  override end(): Promise<void>;
  override end(callback: () => void): void;
  override end(callback?: () => void): Promise<void> | void {
    const ended = super.end();
    this.dropListener();
    if (callback === undefined) return ended;
    void ended.then(callback);
  }

  override connect(): Promise<pg.PoolClient>;
  override connect(callback: Callback): void;
  override connect(callback?: Callback): Promise<pg.PoolClient> | void {
    // the pool's own queries come this way and look after their client themselves
    if (callback) return super.connect(callback);
    return this.connectListener();
  }

  private async connectListener(): Promise<pg.PoolClient> {
    // whoever asks at the end hears nothing any more: a refusal would have the adapter ask again, for ever
    const nothing = new Promise<pg.PoolClient>(() => undefined);
    if (this.ending) return nothing;
    const client = await super.connect();
    if (this.ending) {
      client.release(true);
      return nothing;
    }
    this.dropListener();
    this.listener = client;
    client.once('end', () => {
      if (this.listener === client) this.listener = null;
      client.release(true);
    });
    return client;
  }

  /** A connection lost while it was set up is asked for twice: two listeners would hear everything twice. */
  private dropListener(): void {
    const former = this.listener;
    if (former === null) return;
    this.listener = null;
    former.removeAllListeners('notification');
    former.removeAllListeners('end');
    former.release(true);
  }
}
