import { useState } from 'react';
import { CheckBox } from '../../components/choice';
import { TextField, type TextFieldProps } from '../../components/text-field';

/** A password, which can be looked at. */
export function PasswordField(props: TextFieldProps) {
  const [isShown, setShown] = useState(false);
  return (
    <div className="grid gap-1.5">
      <TextField {...props} type={isShown ? 'text' : 'password'} spellCheck={false} autoCapitalize="none" />
      <CheckBox
        label={<span className="text-sm">Show it</span>}
        checked={isShown}
        onChange={(event) => setShown(event.target.checked)}
      />
    </div>
  );
}
