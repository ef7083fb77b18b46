import { Box, Link } from '@mui/material';
import { DataGrid, type GridColDef, type GridSortModel } from '@mui/x-data-grid';
import { useQuery } from '@tanstack/react-query';
import { type Area } from '@tailrace/shared/contracts/people';
import { type ValveRow } from '@tailrace/shared/contracts/valves';
import { roleWords, screenWords } from '@tailrace/shared/messages/screens';
import { signalRoles } from '@tailrace/shared/core/series';
import { Link as RouterLink } from 'react-router-dom';
import { significant } from '../../lib/numbers';
import { Choice } from '../../ui/Choice';
import { EmptyState } from '../../ui/EmptyState';
import { FailedState } from '../../ui/FailedState';
import { WordFilter } from '../../ui/WordFilter';
import { valvesQuery } from './api';
import { registerAsked, type RegisterView } from './register-asked';

interface ValveRegisterProps {
  view: RegisterView;
  areas: readonly Area[];
  onChange: (change: RegisterView) => void;
}

const columns: GridColDef<ValveRow>[] = [
  {
    field: 'tag',
    headerName: 'Tag',
    width: 130,
    renderCell: ({ row }) => (
      <Link
        component={RouterLink}
        to={`/valves/${encodeURIComponent(row.tag)}`}
        underline="hover"
        sx={{ fontWeight: 700 }}
      >
        {row.tag}
      </Link>
    ),
  },
  { field: 'service', headerName: 'Service', flex: 1.5, minWidth: 180, valueFormatter: written },
  { field: 'area', headerName: 'Area', flex: 1, minWidth: 120, valueGetter: (_, row) => row.area.name },
  {
    field: 'characteristic',
    headerName: 'Characteristic',
    width: 140,
    sortable: false,
    valueFormatter: written,
  },
  {
    field: 'ratedCoefficient',
    headerName: 'Rated coefficient',
    width: 140,
    align: 'right',
    headerAlign: 'right',
    sortable: false,
    renderCell: ({ row }) =>
      row.ratedCoefficient === null
        ? '–'
        : `${significant(row.ratedCoefficient)}\u00a0${row.coefficientUnit}`,
  },
  { field: 'criticality', headerName: 'Criticality', width: 100 },
  {
    field: 'trip',
    headerName: 'Duty',
    width: 80,
    sortable: false,
    valueFormatter: (trip: boolean) => (trip ? 'trip' : 'control'),
  },
  {
    field: 'signalRoles',
    headerName: 'Signals bound',
    flex: 2.5,
    minWidth: 300,
    sortable: false,
    valueFormatter: (roles: ValveRow['signalRoles']) =>
      roles.length > 0
        ? signalRoles
            .filter((role) => roles.includes(role))
            .map((role) => roleWords[role])
            .join(', ')
        : 'none',
  },
];

function written(value: string | null): string {
  return value ?? '–';
}

/** The register: every valve of the person's areas, paged, sorted and filtered on the server. */
export function ValveRegister({ view, areas, onChange }: ValveRegisterProps) {
  const asked = registerAsked(view);
  const query = useQuery(valvesQuery(asked));
  const sortModel: GridSortModel = [{ field: asked.sort, sort: asked.direction }];
  const narrowed = Boolean(view.q ?? view.area);

  return (
    <>
      <Box
        className="screen-only"
        role="search"
        aria-label="Narrow the register down"
        sx={{ display: 'flex', flexWrap: 'wrap', gap: 1.5, pt: 1, mb: 1 }}
      >
        <Choice
          label="Area"
          none="all areas"
          value={view.area}
          options={areas.map((area) => ({ value: area.id, word: area.name }))}
          onChoose={(area) => onChange({ area })}
        />
        <WordFilter label="Tag or service" value={view.q} onChange={(q) => onChange({ q })} />
      </Box>
      {query.isError ? (
        <FailedState error={query.error} onRetry={() => void query.refetch()} />
      ) : query.data?.total === 0 && !query.isPlaceholderData ? (
        <EmptyState title={(narrowed ? screenWords.nothingFits : screenWords.valvesEmpty).title}>
          {(narrowed ? screenWords.nothingFits : screenWords.valvesEmpty).detail}
        </EmptyState>
      ) : (
        <DataGrid
          aria-label="Register of valves"
          autoHeight
          rows={query.data?.rows ?? []}
          columns={columns}
          rowCount={query.data?.total ?? -1}
          loading={query.isFetching && (query.data === undefined || query.isPlaceholderData)}
          paginationMode="server"
          sortingMode="server"
          filterMode="server"
          disableColumnFilter
          disableColumnMenu
          sortingOrder={['asc', 'desc']}
          sortModel={sortModel}
          onSortModelChange={([first]) =>
            onChange({ sort: first?.field, direction: first?.sort === 'desc' ? 'desc' : undefined })
          }
          pageSizeOptions={[25, 50, 100]}
          paginationModel={{ page: asked.page, pageSize: asked.pageSize }}
          onPaginationModelChange={({ page, pageSize }) =>
            onChange({
              page: page > 0 && pageSize === asked.pageSize ? String(page + 1) : undefined,
              rows: pageSize === 50 ? undefined : String(pageSize),
            })
          }
        />
      )}
    </>
  );
}
