import { describe, expect, it } from 'vitest';
import { runDraftOf, startForm } from './start-form';

describe('asking for a run', () => {
  it('means every valve and the usual window when nothing is entered', () => {
    expect(runDraftOf({ tags: ' ', from: '', to: '' }, 'Europe/Zurich')).toEqual({});
  });

  it('takes tags parted by commas, spaces or lines, each once', () => {
    expect(runDraftOf({ tags: 'FV-1, FV-2\nFV-1', from: '', to: '' }, 'UTC').tags).toEqual(['FV-1', 'FV-2']);
  });

  it('lets days begin and end in the site’s zone, the last day included', () => {
    const draft = runDraftOf({ tags: '', from: '2026-10-24', to: '2026-10-25' }, 'Europe/Zurich');
    // summer time ends on 25 October 2026: that day begins at UTC+2 and ends at UTC+1
    expect(draft).toEqual({ from: '2026-10-23T22:00:00.000Z', to: '2026-10-25T23:00:00.000Z' });
  });

  it('refuses a tag no valve can have, and a last day before the first', () => {
    expect(startForm.safeParse({ tags: 'FV 1/2', from: '', to: '' }).success).toBe(false);
    expect(startForm.safeParse({ tags: '', from: '2026-11-02', to: '2026-11-01' }).success).toBe(false);
    expect(startForm.safeParse({ tags: 'FV-1', from: '2026-11-01', to: '2026-11-01' }).success).toBe(true);
  });
});
