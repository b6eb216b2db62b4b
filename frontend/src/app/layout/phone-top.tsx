import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Icon } from '../../components/icon';
import { useWorker } from '../use-worker';
import { FindBox } from './find-box';
import { NameMenu } from './name-menu';
import './phone-top.css';

/** The first line of a phone page: who works for whom, and find. */
export function PhoneTop(): ReactNode {
  const { t } = useTranslation('app');
  const [isFinding, setIsFinding] = useState(false);
  const { isOperatorFrame } = useWorker();
  return (
    <header className="phone-top">
      {isFinding ? <FindBox isPhone onLeave={() => setIsFinding(false)} /> : <NameMenu isPhone />}
      {isOperatorFrame ? null : (
        <button
          type="button"
          className="tap"
          aria-expanded={isFinding}
          aria-label={isFinding ? t('find.close') : t('find.label')}
          onClick={() => setIsFinding(!isFinding)}
        >
          <Icon name={isFinding ? 'close' : 'find'} size={24} />
        </button>
      )}
    </header>
  );
}
