import { AsyncLocalStorage } from 'node:async_hooks';
import { Sequelize } from 'sequelize';

type Values = Map<string, unknown>;
const storage = new AsyncLocalStorage<Values>();

/**
 * Sequelize finds the running transaction here by itself, so that no query inside a unit of work can forget to join it. It asks for the
 * small surface of a cls namespace; AsyncLocalStorage gives the same without another package.
 */
const namespace = {
  get: (key: string) => storage.getStore()?.get(key),
  set: (key: string, value: unknown) => {
    storage.getStore()?.set(key, value);
    return value;
  },
  run: <T>(work: (values: Values) => T): T => {
    const values: Values = new Map(storage.getStore() ?? []);
    return storage.run(values, () => work(values));
  },
  bind: <T>(work: T): T => work,
};

/** Must run before the first Sequelize is made. */
export function joinTransactionsByContext(): void {
  Sequelize.useCLS(namespace);
}
