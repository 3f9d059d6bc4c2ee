// A password: may be pasted, may be shown, and a password manager knows what it is.
import { useState, type ComponentProps } from 'react';
import { Checkbox } from '../../ui/form/checkbox';
import { TextInput } from '../../ui/form/text-input';

type PasswordFieldProps = Omit<ComponentProps<typeof TextInput>, 'type' | 'autoComplete' | 'hint'> & {
  /** A new one is made up here; the current one is known already. */
  readonly isNew?: boolean;
};

const NEW_HINT = 'At least 12 characters. A short sentence is easy to keep in mind.';

export function PasswordField({ isNew = false, ...input }: PasswordFieldProps) {
  const [shown, setShown] = useState(false);
  return (
    <div className="grid gap-4">
      <TextInput
        {...input}
        type={shown ? 'text' : 'password'}
        autoComplete={isNew ? 'new-password' : 'current-password'}
        autoCapitalize="none"
        spellCheck={false}
        hint={isNew ? NEW_HINT : undefined}
      />
      <Checkbox
        label={<span className="sm">Show the password</span>}
        checked={shown}
        onChange={(event) => setShown(event.target.checked)}
      />
    </div>
  );
}
