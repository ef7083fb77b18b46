import { Box, Button } from '@mui/material';

interface PagesProps {
  page: number;
  pageSize: number;
  total: number;
  /** what is counted, as many: "valves" */
  what: string;
  onPage: (page: number) => void;
}

/** The way through a list that is paged on the server: "51 to 100 of 312 valves". */
export function Pages({ page, pageSize, total, what, onPage }: PagesProps) {
  if (total === 0) return null;
  const from = page * pageSize + 1;
  const to = Math.min(total, (page + 1) * pageSize);
  return (
    <Box
      component="nav"
      aria-label={`Pages of ${what}`}
      sx={{ display: 'flex', gap: 1, alignItems: 'center', py: 1 }}
    >
      <span>
        {from === 1 && to === total
          ? `${total} ${total === 1 ? what.replace(/s$/, '') : what}`
          : `${from} to ${to} of ${total} ${what}`}
      </span>
      {total > pageSize && (
        <Box className="screen-only" sx={{ display: 'flex' }}>
          <Button disabled={page === 0} onClick={() => onPage(page - 1)}>
            Earlier
          </Button>
          <Button disabled={to >= total} onClick={() => onPage(page + 1)}>
            Further
          </Button>
        </Box>
      )}
    </Box>
  );
}
