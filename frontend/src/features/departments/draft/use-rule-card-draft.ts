import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { useMemo, useState } from 'react';
import { useFieldWords } from '../../../lib/errors';
import type { DraftFaults } from './draft-context';
import { contractFaults, type Faults, publishingFaults, refusedFaults } from './fault-codes';

export interface RuleCardDraft {
  readonly content: RuleCardContent;
  /** Takes what was typed; marks at or under `path` go until it is looked at again. */
  readonly edit: (path: string, next: RuleCardContent) => void;
  readonly faults: DraftFaults;
  readonly faultCount: number;
  /** Whether it can be saved; marks the fields where it cannot. */
  readonly check: () => boolean;
  readonly takeError: (error: unknown) => void;
  /** After saving: marks what still keeps it from being published. */
  readonly lookAtWhole: () => void;
}

/** A draft as it is typed, with what is wrong beside each field: from the first look on, what keeps it from being published. */
export function useRuleCardDraft({ content: saved }: RuleCard): RuleCardDraft {
  const [content, setContent] = useState(saved);
  const [faults, setFaults] = useState<Faults>(() => publishingFaults(saved));
  const words = useFieldWords();
  const shown = useMemo(
    () => ({
      faultOf: (path: string) => words(faults[path]),
      countUnder: (path: string) => Object.keys(faults).filter((each) => isAtOrUnder(each, path)).length,
    }),
    [faults, words],
  );
  return {
    content,
    edit: (path, next) => {
      setContent(next);
      setFaults((before) => Object.fromEntries(Object.entries(before).filter(([each]) => !isAtOrUnder(each, path))));
    },
    faults: shown,
    faultCount: Object.keys(faults).length,
    check: () => {
      const found = contractFaults(content);
      setFaults(found);
      return Object.keys(found).length === 0;
    },
    takeError: (error) => setFaults(refusedFaults(error)),
    lookAtWhole: () => setFaults(publishingFaults(content)),
  };
}

function isAtOrUnder(path: string, parent: string): boolean {
  return path === parent || path.startsWith(`${parent}.`);
}
