import { useEffect, useState } from 'react';
import { TextField } from './text-field.tsx';

/** A word to find rows by; `onFind` hears it a moment after the last key. `label`, `value`, `placeholder`. */
export function FindField(props: {
  label: string;
  value: string;
  onFind: (text: string) => void;
  placeholder?: string;
  className?: string;
}) {
  const { label, value, onFind, placeholder, className } = props;
  const [text, setText] = useState(value);
  useEffect(() => {
    if (text.trim() === value) return;
    const timer = setTimeout(() => onFind(text.trim()), 300);
    return () => clearTimeout(timer);
  }, [text, value, onFind]);
  return (
    <TextField
      label={label}
      type="search"
      value={text}
      maxLength={80}
      placeholder={placeholder}
      className={className}
      onChange={(event) => setText(event.target.value)}
    />
  );
}
