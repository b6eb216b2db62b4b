import pg from 'pg';

/**
 * A client whose errors have a listener from the first moment. Sequelize adds its own only after the connection stands; a database that
 * ends the connection right then would end the process. The client is unusable afterwards and says so to whoever asks it next.
 */
class SteadyClient extends pg.Client {
  constructor(config?: string | pg.ClientConfig) {
    super(config);
    this.on('error', () => undefined);
  }
}

/** The driver, with that client. */
export const steadyPg = { ...pg, Client: SteadyClient };
