import { type Area } from '@tailrace/shared/contracts/people';
import { role, type Role } from '@tailrace/shared/contracts/policy';
import { type Valve } from '@tailrace/shared/contracts/valves';
import { aValve } from './a-valve.js';
import { password } from './a-service.js';

/** What there is in one area when its people, and strangers to it, knock at each route. */
export interface Ground {
  readonly area: Area;
  readonly valve: Valve;
  readonly runId: string;
  readonly assessmentId: string;
  readonly adminEmail: string;
  /** a trend file only received, new at each call, so that one asker cannot spoil it for the next */
  freshFile(): Promise<string>;
  /** a run that still waits, new at each call */
  freshRun(): Promise<string>;
}

export interface Knock {
  readonly path: string;
  readonly body?: object;
  readonly file?: string;
}

/** Who may call a route, and what it answers to them and to people of another area. */
export interface RouteRow {
  readonly route: string;
  readonly who: 'anybody' | 'signed in' | readonly Role[];
  readonly knock: (ground: Ground) => Knock | Promise<Knock>;
  /** status for those who may, in the area the thing is in */
  readonly granted: number;
  /** status for those whose role may, but whose area is another */
  readonly stranger: number;
  /** text that a stranger's answer must not hold; for lists, which answer everybody but not the same */
  readonly hidden?: (ground: Ground) => string;
}

const everyRole = role.options;
const editors: readonly Role[] = ['engineer', 'admin'];
const takers: readonly Role[] = ['operator', 'engineer', 'admin'];
const admins: readonly Role[] = ['admin'];

const columnPlan = {
  form: 'wide',
  delimiter: ',',
  decimalMark: '.',
  headerLine: 1,
  time: { column: 'Time', format: 'iso', zone: 'UTC' },
  long: null,
};

const edited = ({ tag, dataSheet, signals, area, version }: Valve) => ({
  tag,
  dataSheet,
  signals,
  areaId: area.id,
  version,
});

let numbered = 0;
const next = () => (numbered += 1);

/** Every route of the API. A route that is missing here fails the test that reads this table. */
export const routeMatrix: readonly RouteRow[] = [
  {
    route: 'GET /api/health',
    who: 'anybody',
    knock: () => ({ path: '/api/health' }),
    granted: 200,
    stranger: 200,
  },
  {
    route: 'POST /api/session',
    who: 'anybody',
    knock: ({ adminEmail }) => ({ path: '/api/session', body: { email: adminEmail, password } }),
    granted: 200,
    stranger: 200,
  },
  {
    // 401 for want of a cookie, whoever asks
    route: 'POST /api/session/refresh',
    who: 'anybody',
    knock: () => ({ path: '/api/session/refresh' }),
    granted: 401,
    stranger: 401,
  },
  {
    route: 'DELETE /api/session',
    who: 'anybody',
    knock: () => ({ path: '/api/session' }),
    granted: 204,
    stranger: 204,
  },
  {
    route: 'GET /api/me',
    who: 'signed in',
    knock: () => ({ path: '/api/me' }),
    granted: 200,
    stranger: 200,
    hidden: ({ area }) => area.id,
  },
  {
    route: 'GET /api/areas',
    who: 'signed in',
    knock: () => ({ path: '/api/areas' }),
    granted: 200,
    stranger: 200,
    hidden: ({ area }) => area.id,
  },
  {
    // An area is added by somebody of all areas; here everybody has one.
    route: 'POST /api/areas',
    who: admins,
    knock: () => ({ path: '/api/areas', body: { code: `NEW${next()}`, name: 'New' } }),
    granted: 403,
    stranger: 403,
  },
  {
    route: 'POST /api/people',
    who: admins,
    knock: ({ area }) => ({
      path: '/api/people',
      body: {
        name: 'New',
        email: `new-${next()}@plant.example`,
        role: 'operator',
        areaIds: [area.id],
        password,
      },
    }),
    granted: 201,
    stranger: 400,
  },
  {
    route: 'GET /api/valves',
    who: everyRole,
    knock: () => ({ path: '/api/valves' }),
    granted: 200,
    stranger: 200,
    hidden: ({ valve }) => valve.tag,
  },
  {
    route: 'GET /api/valves/:tag',
    who: everyRole,
    knock: ({ valve }) => ({ path: `/api/valves/${valve.tag}` }),
    granted: 200,
    stranger: 404,
  },
  {
    route: 'POST /api/valves',
    who: editors,
    knock: ({ area }) => ({ path: '/api/valves', body: aValve({ areaId: area.id }) }),
    granted: 201,
    stranger: 400,
  },
  {
    // 409: past who may and where, the version is one that nobody saw
    route: 'PUT /api/valves/:tag',
    who: editors,
    knock: ({ valve }) => ({ path: `/api/valves/${valve.tag}`, body: { ...edited(valve), version: 999 } }),
    granted: 409,
    stranger: 404,
  },
  {
    route: 'GET /api/valves/:tag/assessment',
    who: everyRole,
    knock: ({ valve }) => ({ path: `/api/valves/${valve.tag}/assessment` }),
    granted: 200,
    stranger: 404,
  },
  {
    route: 'GET /api/valves/:tag/assessments',
    who: everyRole,
    knock: ({ valve }) => ({ path: `/api/valves/${valve.tag}/assessments` }),
    granted: 200,
    stranger: 404,
  },
  {
    route: 'GET /api/assessments/:id',
    who: everyRole,
    knock: ({ assessmentId }) => ({ path: `/api/assessments/${assessmentId}` }),
    granted: 200,
    stranger: 404,
  },
  {
    route: 'GET /api/valves/:tag/findings',
    who: everyRole,
    knock: ({ valve }) => ({ path: `/api/valves/${valve.tag}/findings` }),
    granted: 200,
    stranger: 404,
  },
  {
    route: 'GET /api/ranking',
    who: everyRole,
    knock: () => ({ path: '/api/ranking' }),
    granted: 200,
    stranger: 200,
    hidden: ({ valve }) => valve.tag,
  },
  {
    route: 'GET /api/trends',
    who: everyRole,
    knock: async ({ freshFile }) => {
      await freshFile();
      return { path: '/api/trends' };
    },
    granted: 200,
    stranger: 200,
    hidden: ({ area }) => area.id,
  },
  {
    route: 'POST /api/trends',
    who: takers,
    knock: ({ area }) => ({ path: '/api/trends', body: { areaId: area.id }, file: `Time,X\n${next()}` }),
    granted: 201,
    stranger: 400,
  },
  {
    route: 'GET /api/trends/:id',
    who: everyRole,
    knock: async ({ freshFile }) => ({ path: `/api/trends/${await freshFile()}` }),
    granted: 200,
    stranger: 404,
  },
  {
    route: 'POST /api/trends/:id/look',
    who: takers,
    knock: async ({ freshFile }) => ({ path: `/api/trends/${await freshFile()}/look`, body: {} }),
    granted: 200,
    stranger: 404,
  },
  {
    route: 'POST /api/trends/:id/take-in',
    who: takers,
    knock: async ({ freshFile }) => ({
      path: `/api/trends/${await freshFile()}/take-in`,
      body: { plan: columnPlan },
    }),
    granted: 202,
    stranger: 404,
  },
  {
    route: 'DELETE /api/trends/:id',
    who: takers,
    knock: async ({ freshFile }) => ({ path: `/api/trends/${await freshFile()}` }),
    granted: 204,
    stranger: 404,
  },
  {
    route: 'GET /api/runs',
    who: everyRole,
    knock: () => ({ path: '/api/runs' }),
    granted: 200,
    stranger: 200,
    hidden: ({ runId }) => runId,
  },
  {
    route: 'POST /api/runs',
    who: editors,
    knock: ({ valve }) => ({ path: '/api/runs', body: { tags: [valve.tag] } }),
    granted: 202,
    stranger: 404,
  },
  {
    route: 'GET /api/runs/:id',
    who: everyRole,
    knock: ({ runId }) => ({ path: `/api/runs/${runId}` }),
    granted: 200,
    stranger: 404,
  },
  {
    route: 'POST /api/runs/:id/stop',
    who: editors,
    knock: async ({ freshRun }) => ({ path: `/api/runs/${await freshRun()}/stop` }),
    granted: 200,
    stranger: 404,
  },
];
