import { useState, type ChangeEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Field } from '../../../components/field';
import { importSample } from '../import-sample';

/** The contract's limit, so that it is said before it is sent. */
const longestCsv = 2_000_000;

/** A list of lots, pasted or chosen as a file, with a sample to begin from. */
export function CsvField({ csv, onChange }: { csv: string; onChange: (csv: string) => void }): ReactNode {
  const { t } = useTranslation('lots');
  const [unread, setUnread] = useState<'too-large' | 'unreadable' | null>(null);
  const take = (event: ChangeEvent<HTMLInputElement>): void => {
    const input = event.target;
    const file = input.files?.[0];
    if (file === undefined) return;
    if (file.size > longestCsv) {
      setUnread('too-large');
      return;
    }
    file.text().then(
      (text) => {
        setUnread(null);
        onChange(text);
        // The same file mended is to be taken again.
        input.value = '';
      },
      () => setUnread('unreadable'),
    );
  };
  return (
    <div className="fields csv-fields">
      <p>
        {t('import.say')} <SampleLink />
      </p>
      <Field label={t('import.file')} error={unread === null ? undefined : t(`import.unread.${unread}`)}>
        {(control) => <input {...control} type="file" accept=".csv,text/csv,text/plain" onChange={take} />}
      </Field>
      <Field label={t('import.paste')} error={csv.length > longestCsv ? t('import.unread.too-large') : undefined}>
        {(control) => (
          <textarea
            {...control}
            className="csv-text"
            rows={12}
            spellCheck={false}
            value={csv}
            onChange={(event) => onChange(event.target.value)}
          />
        )}
      </Field>
    </div>
  );
}

/** Made here, in the page: nothing is fetched. */
function SampleLink(): ReactNode {
  const { t } = useTranslation('lots');
  const save = (): void => {
    const url = URL.createObjectURL(new Blob([importSample()], { type: 'text/csv;charset=utf-8' }));
    const link = document.createElement('a');
    link.href = url;
    link.download = 'lots-sample.csv';
    link.click();
    URL.revokeObjectURL(url);
  };
  return (
    <button type="button" className="link-act" onClick={save}>
      {t('import.sample')}
    </button>
  );
}
