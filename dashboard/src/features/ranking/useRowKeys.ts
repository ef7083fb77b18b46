import { useEffect, type RefObject } from 'react';

const steps: Partial<Record<string, number>> = { j: 1, ArrowDown: 1, k: -1, ArrowUp: -1 };

/**
 * Moves the focus from row to row: j and k from anywhere on the page, the arrows once a row has it.
 *
 * @param list the element whose `[data-row-link]` links are the rows; Enter opens the one that has the focus
 */
export function useRowKeys(list: RefObject<HTMLElement | null>): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const step = steps[event.key];
      if (step === undefined || event.ctrlKey || event.metaKey || event.altKey || event.shiftKey) return;
      const target = event.target as HTMLElement;
      if (target.closest('input, textarea, select, [contenteditable], [role="listbox"], [role="menu"]'))
        return;
      const links = [...(list.current?.querySelectorAll<HTMLElement>('[data-row-link]') ?? [])];
      const at = links.indexOf(document.activeElement as HTMLElement);
      if (at < 0 && event.key.startsWith('Arrow')) return;
      const next = links[at < 0 ? 0 : Math.min(links.length - 1, Math.max(0, at + step))];
      if (!next) return;
      event.preventDefault();
      next.focus({ preventScroll: true });
      next.closest('tr')?.scrollIntoView?.({ block: 'nearest' });
    };
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  }, [list]);
}
