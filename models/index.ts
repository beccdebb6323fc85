import type { Sequelize } from 'sequelize';
import { defineServerState } from './server-state';
import { defineTeam } from './team';
import { defineUser } from './user';
import { defineMembership } from './membership';
import { defineSession } from './session';
import { defineLoginAttempt } from './login-attempt';
import { defineDevice } from './device';
import { defineTeamCounter } from './team-counter';
import { defineOp } from './op';
import { defineQuarantinedOp } from './quarantined-op';
import { defineAuditEntry } from './audit-entry';
import { defineHost } from './host';
import { defineTaxon } from './taxon';
import { defineSettingsVersion } from './settings-version';
import { defineSettingsDraft } from './settings-draft';
import { defineTemperature } from './temperature';
import { defineTemperatureDay } from './temperature-day';
import { defineTemperatureReading } from './temperature-reading';
import { defineDurationSet } from './duration-set';
import { defineNest } from './nest';
import { defineVisit } from './visit';
import { defineReading } from './reading';
import { defineMark } from './mark';
import { defineRetraction } from './retraction';
import { defineSettlement } from './settlement';
import { defineOutcome } from './outcome';
import { defineEstimate } from './estimate';
import { defineReviewClaim } from './review-claim';
import { definePrimaryChoice } from './primary-choice';
import { defineReadingLock } from './reading-lock';
import { defineReadingSample } from './reading-sample';
import { defineInvitation } from './invitation';
import { defineResetToken } from './reset-token';
import { defineLetter } from './letter';

/**
 * Defines every model on a connection and ties them together.
 * Called once for each evaluation of the server code; only the connection pool is shared between them.
 */
export function defineModels(sequelize: Sequelize) {
  return {
    ServerState: defineServerState(sequelize),
    Team: defineTeam(sequelize),
    User: defineUser(sequelize),
    Membership: defineMembership(sequelize),
    Session: defineSession(sequelize),
    LoginAttempt: defineLoginAttempt(sequelize),
    Device: defineDevice(sequelize),
    TeamCounter: defineTeamCounter(sequelize),
    Op: defineOp(sequelize),
    QuarantinedOp: defineQuarantinedOp(sequelize),
    AuditEntry: defineAuditEntry(sequelize),
    Host: defineHost(sequelize),
    Taxon: defineTaxon(sequelize),
    SettingsVersion: defineSettingsVersion(sequelize),
    SettingsDraft: defineSettingsDraft(sequelize),
    Temperature: defineTemperature(sequelize),
    TemperatureDay: defineTemperatureDay(sequelize),
    TemperatureReading: defineTemperatureReading(sequelize),
    DurationSet: defineDurationSet(sequelize),
    Nest: defineNest(sequelize),
    Visit: defineVisit(sequelize),
    Reading: defineReading(sequelize),
    Mark: defineMark(sequelize),
    Retraction: defineRetraction(sequelize),
    Settlement: defineSettlement(sequelize),
    Outcome: defineOutcome(sequelize),
    Estimate: defineEstimate(sequelize),
    ReviewClaim: defineReviewClaim(sequelize),
    PrimaryChoice: definePrimaryChoice(sequelize),
    ReadingLock: defineReadingLock(sequelize),
    ReadingSample: defineReadingSample(sequelize),
    Invitation: defineInvitation(sequelize),
    ResetToken: defineResetToken(sequelize),
    Letter: defineLetter(sequelize),
  };
}

/** The models bound to one connection. */
export type Models = ReturnType<typeof defineModels>;
