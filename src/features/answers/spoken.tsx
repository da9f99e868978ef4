import { Fragment } from 'react';
import { Mark } from '../../ui/answer-header.tsx';
import type { Sentence } from './sentences/parts.ts';

/** A sentence with chalk under its figures. */
export function Spoken({ sentence }: { sentence: Sentence }) {
  return sentence.map((part, at) =>
    typeof part === 'string' ? <Fragment key={at}>{part}</Fragment> : <Mark key={at}>{part.mark}</Mark>,
  );
}
