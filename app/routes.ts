import { index, layout, type RouteConfig, route } from '@react-router/dev/routes'

/** The whole URL map. A route is added here by hand, in the block it belongs to. */
export default [
  // open to everybody
  route('health', 'routes/health.ts'),
  route('health/ready', 'routes/health-ready.ts'),
  route('sign-in', 'routes/sign-in.tsx'),
  route('sign-out', 'routes/sign-out.ts'),
  route('theme', 'routes/theme.ts'),
  route('draft', 'routes/draft.ts'),
  route('still-here', 'routes/still-here.ts'),
  route('calendar/:secret/tubes.ics', 'routes/calendar.ts'),

  layout('routes/signed-in.tsx', [
    index('routes/home.ts'),

    // wards
    route('round', 'routes/round.tsx'),
    route('tubes', 'routes/tubes.tsx'),
    route('wards/:wardId/board', 'routes/board.tsx'),
    route('wards/:wardId/admit', 'routes/admit.tsx'),
    route('wards/:wardId/supplies', 'routes/supplies.tsx'),
    route('wards/:wardId/supplies/order.csv', 'routes/supplies-order.ts'),
    route('wards/:wardId/supplies/history', 'routes/supplies-history.tsx'),
    route('wards/:wardId/supplies/:act', 'routes/supplies-act.tsx'),

    // patients
    route('patients', 'routes/patients.tsx'),
    route('patients/:patientId', 'routes/patient.tsx', [
      index('routes/timeline.tsx'),
      route('emergency', 'routes/emergency.tsx'),
      route('sign', 'routes/sign.tsx'),
      route('photographs', 'routes/patient-photographs.tsx'),
      route('trends', 'routes/patient-trends.tsx'),
      route('weaning', 'routes/patient-weaning.tsx'),
      route('act-now/:entryId', 'routes/act-now.tsx'),
      route('chart/:kind', 'routes/chart.tsx'),
      route('details', 'routes/patient-details.tsx'),
      route('move', 'routes/move.tsx'),
      route('discharge', 'routes/discharge.tsx'),
    ]),
    route('patients/:patientId/sign.pdf', 'routes/sign-pdf.ts'),
    route('photographs/:photographId', 'routes/photograph.ts'),
    route('entries/:entryId', 'routes/entry.tsx'),
    route('entries/:entryId/correct', 'routes/correct.tsx'),
    route('entries/:entryId/retract', 'routes/retract.tsx'),

    // catalogue
    route('catalogue', 'routes/catalogue.tsx'),
    route('catalogue/import', 'routes/catalogue-import.tsx'),
    route('catalogue/compare', 'routes/catalogue-compare.tsx'),
    route('catalogue/lines/:lineId', 'routes/catalogue-line.tsx'),
    route('catalogue/:items/new', 'routes/catalogue-item-new.tsx'),
    route('catalogue/:items/:itemId', 'routes/catalogue-item.tsx'),
    route('catalogue/:items/:itemId/edit', 'routes/catalogue-item-edit.tsx'),

    // devices
    route('scan', 'routes/scan.tsx'),
    route('scan/set-up', 'routes/scan-set-up.tsx'),
    route('lots', 'routes/lots.tsx'),
    route('lots/export', 'routes/lots-export.ts'),

    // people and rules
    route('countersign', 'routes/countersign.tsx'),
    route('competence', 'routes/competence.tsx'),
    route('competence/:userId', 'routes/competence-person.tsx'),
    route('account', 'routes/account.tsx'),
    route('sign-out-everywhere', 'routes/sign-out-everywhere.ts'),
    route('admin/people', 'routes/admin-people.tsx'),
    route('admin/people/new', 'routes/admin-person-new.tsx'),
    route('admin/people/:userId', 'routes/admin-person.tsx'),
    route('admin/wards', 'routes/admin-wards.tsx'),
    route('admin/wards/:wardId', 'routes/admin-ward.tsx'),
    route('patients/:patientId/access', 'routes/patient-access.tsx'),
    route('wards/:wardId/access', 'routes/ward-access.tsx'),
    route('policy', 'routes/policy.tsx'),
    route('policy/draft', 'routes/policy-draft.tsx'),
    route('policy/review', 'routes/policy-review.tsx'),
    route('policy/compare', 'routes/policy-compare.tsx'),
    route('policy/versions/:policyId/withdraw', 'routes/policy-withdraw.tsx'),
    route('wards/:wardId/care-plans', 'routes/ward-care-plans.tsx'),
  ]),

  // files
  route('catalogue/export', 'routes/catalogue-export.ts'),

  // data for live pages
  route('api/patients/:patientId/timeline', 'routes/api-timeline.ts'),
  route('api/wards/:wardId/board', 'routes/api-board.ts'),
] satisfies RouteConfig
