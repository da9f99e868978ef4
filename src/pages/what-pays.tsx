import { PageHeader } from '../ui/answer-header.tsx';

export function WhatPaysPage() {
  return <PageHeader title="Which wrecks pay?" />;
}
