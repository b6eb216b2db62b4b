import { startMailbox } from './start-mailbox.js';

/** The environment of the mailbox; every fault is told at once. */
function readEnvironment(): { smtpPort: number; httpPort: number; directory: string } {
  const { SMTP_PORT, MAILBOX_PORT, MAILBOX_DIR } = process.env;
  const faults = [
    ...portFaults('SMTP_PORT', SMTP_PORT),
    ...portFaults('MAILBOX_PORT', MAILBOX_PORT),
    ...(MAILBOX_DIR ? [] : ['MAILBOX_DIR is missing: set it to the folder that keeps the mails.']),
  ];
  if (faults.length > 0) throw new Error(faults.join('\n'));
  return { smtpPort: Number(SMTP_PORT), httpPort: Number(MAILBOX_PORT), directory: MAILBOX_DIR ?? '' };
}

function portFaults(name: string, value: string | undefined): string[] {
  const port = value && /^\d+$/.test(value) ? Number(value) : NaN;
  return port <= 65_535 ? [] : [`${name} is missing or no port: set it to a number up to 65535, 0 for any free one.`];
}

async function main(): Promise<void> {
  const mailbox = await startMailbox(readEnvironment());
  let isStopping = false;
  const stop = () => {
    if (isStopping) return;
    isStopping = true;
    mailbox.stop().then(() => process.exit(0), fail);
  };
  process.on('SIGTERM', stop);
  process.on('SIGINT', stop);
  console.log(`Mailbox: mail to ${mailbox.smtpUrl}, read it at ${mailbox.httpUrl}`);
}

function fail(error: unknown): void {
  const message = error instanceof Error ? error.message : String(error);
  console.error(
    message.includes('EADDRINUSE')
      ? `The mailbox cannot start: ${message}. End what uses the port, or choose another by SMTP_PORT or MAILBOX_PORT.`
      : `The mailbox cannot run:\n${message}`,
  );
  process.exit(1);
}

main().catch(fail);
