import { wards } from './0001-wards.ts'
import { users } from './0002-users.ts'
import { wardMembers } from './0003-ward-members.ts'
import { sessions } from './0004-sessions.ts'
import { signInAttempts } from './0005-sign-in-attempts.ts'
import { accessLog } from './0006-access-log.ts'
import { patients } from './0010-patients.ts'
import { stays } from './0011-stays.ts'
import { bedMoves } from './0012-bed-moves.ts'
import { entries } from './0013-entries.ts'
import { policies } from './0014-policies.ts'
import { recordChanges } from './0015-record-changes.ts'
import { accessGrants } from './0020-access-grants.ts'
import { drafts } from './0021-drafts.ts'
import { installation } from './0030-installation.ts'
import { tubeLines } from './0040-tube-lines.ts'
import { tubes } from './0041-tubes.ts'
import { innerCannulas } from './0042-inner-cannulas.ts'
import { catalogueChanges } from './0043-catalogue-changes.ts'
import { calendarFeeds } from './0050-calendar-feeds.ts'
import { emergencyNumbers } from './0055-emergency-numbers.ts'
import { airwayDetails } from './0056-airway-details.ts'
import { photographs } from './0058-photographs.ts'
import { entryLots } from './0060-entry-lots.ts'
import { lotRecalls } from './0061-lot-recalls.ts'
import { stockMoves } from './0062-stock-moves.ts'
import { entrySignatures } from './0070-entry-signatures.ts'
import { supervision } from './0071-supervision.ts'
import { countersignatures } from './0072-countersignatures.ts'
import { competences } from './0073-competences.ts'
import { policyRuleSets } from './0080-policy-rule-sets.ts'
import { policyWithdrawals } from './0081-policy-withdrawals.ts'
import { policyDrafts } from './0082-policy-drafts.ts'
import { lineNames } from './0090-line-names.ts'
import type { Migration } from './migration.ts'

/** Every migration under its name, in the order in which they are applied. */
export const migrations: Record<string, Migration> = {
  '0001-wards': wards,
  '0002-users': users,
  '0003-ward-members': wardMembers,
  '0004-sessions': sessions,
  '0005-sign-in-attempts': signInAttempts,
  '0006-access-log': accessLog,
  '0010-patients': patients,
  '0011-stays': stays,
  '0012-bed-moves': bedMoves,
  '0013-entries': entries,
  '0014-policies': policies,
  '0015-record-changes': recordChanges,
  '0020-access-grants': accessGrants,
  '0021-drafts': drafts,
  '0030-installation': installation,
  '0040-tube-lines': tubeLines,
  '0041-tubes': tubes,
  '0042-inner-cannulas': innerCannulas,
  '0043-catalogue-changes': catalogueChanges,
  '0050-calendar-feeds': calendarFeeds,
  '0055-emergency-numbers': emergencyNumbers,
  '0056-airway-details': airwayDetails,
  '0058-photographs': photographs,
  '0060-entry-lots': entryLots,
  '0061-lot-recalls': lotRecalls,
  '0062-stock-moves': stockMoves,
  '0070-entry-signatures': entrySignatures,
  '0071-supervision': supervision,
  '0072-countersignatures': countersignatures,
  '0073-competences': competences,
  '0080-policy-rule-sets': policyRuleSets,
  '0081-policy-withdrawals': policyWithdrawals,
  '0082-policy-drafts': policyDrafts,
  '0090-line-names': lineNames,
}
