'use client';

import type { ReactNode } from 'react';
import { useEffect, useState } from 'react';
import { TextField } from './field';

interface SearchFieldProps {
  label: ReactNode;
  value: string;
  /** Called when typing has paused. */
  onSearch: (text: string) => void;
  fieldClassName?: string;
}

const PAUSE_MS = 250;

/** A search that follows the typing without asking for every letter. */
export function SearchField({ label, value, onSearch, fieldClassName }: SearchFieldProps) {
  const [text, setText] = useState(value);
  const [known, setKnown] = useState(value);
  if (known !== value) {
    // The address changed by another way (back button, cleared filters).
    setKnown(value);
    setText(value);
  }
  useEffect(() => {
    if (text === value) return;
    const timer = setTimeout(() => onSearch(text), PAUSE_MS);
    return () => clearTimeout(timer);
  }, [text, value, onSearch]);
  return (
    <TextField
      label={label}
      type="search"
      value={text}
      onChange={(event) => setText(event.target.value)}
      {...(fieldClassName ? { fieldClassName } : {})}
    />
  );
}
