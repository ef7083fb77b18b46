import { siteTime, utcTime, type TimeForm } from '../lib/dates';
import { useMe } from '../lib/session-query';

interface InstantProps {
  at: string | null;
  form?: TimeForm;
}

/** A time in the site's zone, with UTC on hover. */
export function Instant({ at, form = 'minute' }: InstantProps) {
  const { zone } = useMe().site;
  if (!at) return <>–</>;
  return (
    <time dateTime={at} title={utcTime(at)} style={{ whiteSpace: 'nowrap' }}>
      {siteTime(at, zone, form)}
    </time>
  );
}
