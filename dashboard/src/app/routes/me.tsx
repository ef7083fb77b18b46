import { Box } from '@mui/material';
import { useMe } from '../../lib/session-query';
import { Facts } from '../../ui/Facts';
import { PageTitle } from '../../ui/PageTitle';

export function Component() {
  const me = useMe();
  return (
    <>
      <PageTitle>Your account</PageTitle>
      <Box sx={{ maxWidth: 520 }}>
        <Facts
          facts={[
            ['Name', me.name],
            ['E-mail', me.email],
            ['Role', me.role],
            ['Areas', me.allAreas ? 'all areas' : me.areas.map((area) => area.name).join(', ')],
            ['Site', me.site.name],
            ['Times shown in', me.site.zone],
          ]}
        />
      </Box>
    </>
  );
}
