import { layout, type RouteConfig, route } from '@react-router/dev/routes'

/** The whole URL map. A route is added here by hand, in the block it belongs to. */
export default [
  // open to everybody
  route('health', 'routes/health.ts'),
  route('health/ready', 'routes/health-ready.ts'),

  layout('routes/signed-in.tsx', [
    // wards
    route('round', 'routes/round.tsx'),
    route('wards/:wardId/board', 'routes/board.tsx'),

    // patients

    // people and rules
    route('policy', 'routes/policy.tsx'),
  ]),

  // data for live pages
  route('api/wards/:wardId/board', 'routes/api-board.ts'),
] satisfies RouteConfig
