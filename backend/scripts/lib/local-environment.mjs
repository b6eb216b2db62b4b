import path from 'node:path';
import { paths, root } from './paths.mjs';
import { loopback } from './ports.mjs';
import { getCleanEnvironment } from './psql.mjs';

/**
 * The environment of everything that runs in the local demo system.
 * @param system { urls: { app, owner }, secrets, ports: { web, server, smtp } }; `web` is where the page is opened, `server`
 *   where the server listens: the same unless vite serves the page
 */
export function getLocalEnvironment({ urls, secrets, ports }) {
  return {
    ...getCleanEnvironment(),
    NODE_ENV: 'development',
    HOLDWATER_MODE: 'demo',
    HOST: loopback,
    PORT: String(ports.server),
    APP_URL: `http://${loopback}:${ports.web}`,
    DATABASE_URL: urls.app,
    JWT_SECRET: secrets.jwtSecret,
    SMTP_URL: `smtp://${loopback}:${ports.smtp}`,
    MAIL_FROM: 'holdwater@example.test',
    ROLE: 'all',
    ...(ports.web === ports.server ? { STATIC_DIR: path.join(root, 'frontend/dist') } : {}),
    TZ: 'UTC',
  };
}

/** The same for the commands that change the database's shape or content. */
export function getDatabaseEnvironment(system) {
  return {
    ...getLocalEnvironment(system),
    DATABASE_MIGRATION_URL: system.urls.owner,
    DEMO_PEOPLE_FILE: paths.demoPeople,
  };
}
