import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Field } from '../../../components/field';

export interface PasswordFieldProps {
  label: string;
  value: string;
  onChange: (value: string) => void;
  /** A password manager fills `current-password` and offers one for `new-password`. */
  autoComplete: 'current-password' | 'new-password';
  labelPlace?: 'above' | 'inside';
  error?: string;
  hint?: string;
  autoFocus?: boolean;
}

/** A password that can be shown while it is typed. */
export function PasswordField({ onChange, labelPlace = 'inside', ...props }: PasswordFieldProps): ReactNode {
  const { t } = useTranslation('accounts');
  const [isShown, setIsShown] = useState(false);
  return (
    <Field
      {...props}
      labelPlace={labelPlace}
      type={isShown ? 'text' : 'password'}
      autoCapitalize="none"
      spellCheck={false}
      maxLength={256}
      onChange={(event) => onChange(event.target.value)}
      trailing={
        <button type="button" className="link-act" aria-pressed={isShown} onClick={() => setIsShown(!isShown)}>
          {isShown ? t('signIn.hide') : t('signIn.show')}
        </button>
      }
    />
  );
}
