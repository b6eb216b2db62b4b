import { noTools, type KeptTools, type SetupDraft } from './test-setup';

const storageKey = 'holdwater.test-tools';

/** The gauge and tape typed last on this device: the same ones go from lot to lot. */
export function readTools(): KeptTools {
  try {
    const kept: unknown = JSON.parse(window.localStorage.getItem(storageKey) ?? '{}');
    return { ...noTools, ...stringsOf(kept) };
  } catch {
    return noTools;
  }
}

export function keepTools({ rangePsi, incrementPsi, incrementIn }: SetupDraft): void {
  try {
    window.localStorage.setItem(storageKey, JSON.stringify({ rangePsi, incrementPsi, incrementIn }));
  } catch {
    // Storage may be blocked: the tools are then typed again.
  }
}

function stringsOf(kept: unknown): Partial<KeptTools> {
  if (typeof kept !== 'object' || kept === null) return {};
  const names = Object.keys(noTools);
  return Object.fromEntries(
    Object.entries(kept).filter(([name, value]) => names.includes(name) && typeof value === 'string'),
  );
}
