'use client';

import type { ComponentProps } from 'react';
import { useState } from 'react';
import { TextField } from '../ui/field';

interface PasswordFieldProps extends ComponentProps<typeof TextField> {
  showLabel: string;
  hideLabel: string;
}

/** A password under its label, with a switch that shows what was typed. */
export function PasswordField({ showLabel, hideLabel, ...field }: PasswordFieldProps) {
  const [shown, setShown] = useState(false);
  return (
    <div className="relative">
      <TextField
        {...field}
        hint={field.error ? undefined : field.hint}
        type={shown ? 'text' : 'password'}
        autoCapitalize="none"
        spellCheck={false}
      />
      <button
        type="button"
        aria-pressed={shown}
        onClick={() => setShown(!shown)}
        className="absolute -top-2 right-0 min-h-8 px-1 text-[13px] font-semibold text-carbon underline underline-offset-2"
      >
        {shown ? hideLabel : showLabel}
      </button>
    </div>
  );
}
