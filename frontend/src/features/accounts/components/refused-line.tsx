import type { ReactNode } from 'react';
import { Icon } from '../../../components/icon';
import { useErrorWords } from '../../../lib/errors';

/** Why a form did not go through, in one line of its title block: "Email or password do not match. 4 tries left." */
export function RefusedLine({ error }: { error: unknown }): ReactNode {
  const words = useErrorWords(error);
  return (
    <div role="alert">
      {words === null ? null : (
        <p className="door-refused">
          <Icon name="caution" size={18} />
          <span>
            {words.title}. {words.safe} {words.next}
            {words.entry !== null && words.code === 'internal' ? ` (${words.entry})` : null}
          </span>
        </p>
      )}
    </div>
  );
}
