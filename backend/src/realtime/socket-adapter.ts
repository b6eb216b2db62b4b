import type { INestApplicationContext } from '@nestjs/common';
import { IoAdapter } from '@nestjs/platform-socket.io';
import { createAdapter } from '@socket.io/postgres-adapter';
import type { Server, ServerOptions } from 'socket.io';
import { ListeningPool } from './listening-pool.js';

/** Sockets whose rooms reach across every server process, over the one PostgreSQL there is. */
export class SocketAdapter extends IoAdapter {
  private readonly pool: ListeningPool;

  constructor(app: INestApplicationContext, databaseUrl: string) {
    super(app);
    this.pool = new ListeningPool({ connectionString: databaseUrl, max: 4, application_name: 'holdwater sockets' });
    // a lost connection is made anew by the adapter; without a listener it would end the process
    this.pool.on('error', () => undefined);
  }

  override createIOServer(port: number, options?: ServerOptions): Server {
    const server = super.createIOServer(port, {
      ...options,
      maxHttpBufferSize: 16_384,
      serveClient: false,
    } as ServerOptions);
    server.adapter(createAdapter(this.pool, { errorHandler: () => undefined }));
    return server;
  }

  override async dispose(): Promise<void> {
    await this.pool.end();
  }
}
