import { useState } from 'react';
import { Button } from './button';
import { TextField, type TextFieldProps } from './text-field';

/** A password, which its owner may look at: long ones are typed wrong unseen. */
export function PasswordField(props: Omit<TextFieldProps, 'type' | 'suffix' | 'isCode'>) {
  const [isShown, setIsShown] = useState(false);
  return (
    <div className="relative">
      <TextField {...props} type={isShown ? 'text' : 'password'} autoCapitalize="none" spellCheck={false} suffix="" />
      <div className="absolute top-0 -right-3 -mt-3.5">
        <Button
          kind="plain"
          size="small"
          aria-pressed={isShown}
          aria-label={`Show what is written in ${props.label}`}
          onPress={() => {
            setIsShown(!isShown);
          }}
        >
          <span className="text-small">{isShown ? 'Hide' : 'Show'}</span>
        </Button>
      </div>
    </div>
  );
}
