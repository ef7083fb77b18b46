import { type ReactNode } from 'react';
import { StateOfPage } from './StateOfPage';

interface EmptyStateProps {
  title: string;
  children?: ReactNode;
  actions?: ReactNode;
}

/** Nothing is here yet, or nothing fits what was asked: why, and what to do about it. */
export function EmptyState(props: EmptyStateProps) {
  return <StateOfPage {...props} />;
}
