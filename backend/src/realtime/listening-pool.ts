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
  }

  override connect(): Promise<pg.PoolClient>;
  override connect(callback: Callback): void;
  override connect(callback?: Callback): Promise<pg.PoolClient> | void {
    // the pool's own queries come this way and look after their client themselves
    if (callback) return super.connect(callback);
    return this.connectListener();
  }

  private async connectListener(): Promise<pg.PoolClient> {
    const client = await super.connect();
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
