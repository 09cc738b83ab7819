import { useEffect } from 'react';

/** Names the browser's tab: what the screen shows first, the product last. */
export function usePageTitle(title: string): void {
  useEffect(() => {
    document.title = title ? `${title} · Slackwater` : 'Slackwater';
  }, [title]);
}
