import type { QueryInterface } from 'sequelize';

const ID = 'BINARY(16) NOT NULL';
const ID_OR_NULL = 'BINARY(16) NULL';
const WHEN = 'DATETIME(3) NOT NULL';
const WHEN_OR_NULL = 'DATETIME(3) NULL';
const WORD = 'VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL';
const HASH = 'BINARY(32) NOT NULL';
const CLOCK_TEXT = 'VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL';
/** Text compared byte by byte, spaces at its end included: two spellings are never taken for one. */
const NAME = 'VARCHAR(200) COLLATE utf8mb4_nopad_bin NOT NULL';
const NAME_OR_NULL = 'VARCHAR(200) COLLATE utf8mb4_nopad_bin NULL';
const TEXT_OR_NULL = 'MEDIUMTEXT NULL';

/** A foreign key within one team. */
function within(table: string, column: string, key = 'id'): string {
  return `FOREIGN KEY (team_id, ${column}) REFERENCES ${table} (team_id, ${key})`;
}

const TABLES: readonly [name: string, lines: readonly string[]][] = [
  ['server_state', ['id TINYINT NOT NULL PRIMARY KEY', 'epoch INT NOT NULL']],
  ['teams', [`id ${ID} PRIMARY KEY`, `name ${NAME}`, `zone ${NAME}`, 'home_lat DOUBLE NULL', 'home_lon DOUBLE NULL']],
  [
    'users',
    [
      `id ${ID} PRIMARY KEY`,
      `email ${NAME}`,
      `display_name ${NAME}`,
      'password_hash VARCHAR(255) CHARACTER SET ascii COLLATE ascii_bin NOT NULL',
      `disabled_at ${WHEN_OR_NULL}`,
      'UNIQUE KEY users_email (email)',
    ],
  ],
  [
    'memberships',
    [
      `team_id ${ID}`,
      `user_id ${ID}`,
      `role ${WORD}`,
      'PRIMARY KEY (team_id, user_id)',
      'FOREIGN KEY (team_id) REFERENCES teams (id)',
      'FOREIGN KEY (user_id) REFERENCES users (id)',
    ],
  ],
  [
    'sessions',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `user_id ${ID}`,
      `created_at ${WHEN}`,
      `last_seen_at ${WHEN}`,
      `expires_at ${WHEN}`,
      `revoked_at ${WHEN_OR_NULL}`,
      'PRIMARY KEY (team_id, id)',
      within('memberships', 'user_id', 'user_id'),
    ],
  ],
  [
    'login_attempts',
    [
      `id ${ID} PRIMARY KEY`,
      `subject ${HASH}`,
      'failed BOOLEAN NOT NULL',
      `at ${WHEN}`,
      'KEY login_attempts_subject (subject, at)',
    ],
  ],
  [
    'devices',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `user_id ${ID}`,
      `label ${NAME}`,
      'device_key BINARY(32) NOT NULL',
      `enrolled_at ${WHEN}`,
      `last_seen_at ${WHEN}`,
      `revoked_at ${WHEN_OR_NULL}`,
      'PRIMARY KEY (team_id, id)',
      within('memberships', 'user_id', 'user_id'),
    ],
  ],
  [
    'team_counters',
    [
      `team_id ${ID} PRIMARY KEY`,
      'seq BIGINT NOT NULL',
      'safe_seq BIGINT NOT NULL',
      'audit_seq BIGINT NOT NULL',
      `audit_hash ${HASH}`,
      'FOREIGN KEY (team_id) REFERENCES teams (id)',
    ],
  ],
  [
    'ops',
    [
      `team_id ${ID}`,
      `op_id ${ID}`,
      'seq BIGINT NOT NULL',
      `kind ${WORD}`,
      `nest_id ${ID_OR_NULL}`,
      `visit_id ${ID_OR_NULL}`,
      `reading_id ${ID_OR_NULL}`,
      `actor_id ${ID}`,
      `device_id ${ID_OR_NULL}`,
      `hlc ${CLOCK_TEXT}`,
      'op LONGTEXT NOT NULL',
      `body_hash ${HASH}`,
      'flags VARCHAR(255) CHARACTER SET ascii COLLATE ascii_bin NOT NULL',
      `received_at ${WHEN}`,
      'PRIMARY KEY (team_id, op_id)',
      'UNIQUE KEY ops_seq (team_id, seq)',
      'KEY ops_nest (team_id, nest_id, kind)',
      'KEY ops_visit (team_id, visit_id, kind)',
      'KEY ops_reading (team_id, reading_id, kind)',
      within('memberships', 'actor_id', 'user_id'),
    ],
  ],
  [
    'quarantined_ops',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `digest ${HASH}`,
      `op_id ${ID_OR_NULL}`,
      `state ${WORD}`,
      `code ${WORD}`,
      'raw LONGTEXT NOT NULL',
      'missing TEXT NOT NULL',
      `actor_id ${ID}`,
      `received_at ${WHEN}`,
      'PRIMARY KEY (team_id, id)',
      'UNIQUE KEY quarantined_digest (team_id, digest)',
      'KEY quarantined_op (team_id, op_id)',
      'KEY quarantined_state (team_id, state)',
      within('memberships', 'actor_id', 'user_id'),
    ],
  ],
  [
    'audit_entries',
    [
      `team_id ${ID}`,
      'seq BIGINT NOT NULL',
      `at ${WHEN}`,
      `actor_id ${ID_OR_NULL}`,
      `action ${WORD}`,
      `subject_id ${ID_OR_NULL}`,
      'detail LONGTEXT NOT NULL',
      `previous_hash ${HASH}`,
      `hash ${HASH}`,
      'PRIMARY KEY (team_id, seq)',
      'KEY audit_subject (team_id, subject_id)',
      'FOREIGN KEY (team_id) REFERENCES teams (id)',
    ],
  ],
  [
    'hosts',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `code ${NAME}`,
      `name ${NAME}`,
      `place_name ${NAME}`,
      'lat DOUBLE NULL',
      'lon DOUBLE NULL',
      'capacity INT NOT NULL',
      `note ${TEXT_OR_NULL}`,
      'withdrawn_on DATE NULL',
      'PRIMARY KEY (team_id, id)',
      'FOREIGN KEY (team_id) REFERENCES teams (id)',
    ],
  ],
  [
    'taxa',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `scientific_name ${NAME}`,
      `status ${WORD}`,
      'PRIMARY KEY (team_id, id)',
      'UNIQUE KEY taxa_name (team_id, scientific_name)',
      'FOREIGN KEY (team_id) REFERENCES teams (id)',
    ],
  ],
  [
    'settings_versions',
    [
      `team_id ${ID}`,
      'version INT NOT NULL',
      'settings LONGTEXT NOT NULL',
      `signed_by ${ID_OR_NULL}`,
      `signed_at ${WHEN}`,
      'PRIMARY KEY (team_id, version)',
      within('memberships', 'signed_by', 'user_id'),
    ],
  ],
  [
    'duration_sets',
    [
      `team_id ${ID}`,
      'version INT NOT NULL',
      `taxon ${NAME}`,
      'egg_days DOUBLE NOT NULL',
      'larva_days DOUBLE NOT NULL',
      'capped_days DOUBLE NOT NULL',
      'reference_c DOUBLE NOT NULL',
      `trust ${WORD}`,
      `source ${NAME}`,
      'PRIMARY KEY (team_id, version, taxon)',
      within('settings_versions', 'version', 'version'),
    ],
  ],
  [
    'nests',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `code ${NAME}`,
      `name ${NAME_OR_NULL}`,
      `taxon ${NAME_OR_NULL}`,
      'lat DOUBLE NULL',
      'lon DOUBLE NULL',
      'accuracy_m DOUBLE NULL',
      `opened_by ${ID}`,
      `opened_at ${WHEN}`,
      `opened_at_text ${NAME}`,
      `archived_at ${WHEN_OR_NULL}`,
      'PRIMARY KEY (team_id, id)',
      'KEY nests_code (team_id, code)',
      within('memberships', 'opened_by', 'user_id'),
    ],
  ],
  [
    'visits',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `nest_id ${ID}`,
      `purpose ${WORD}`,
      `started_at ${WHEN}`,
      `started_at_text ${NAME}`,
      `opened_by ${ID}`,
      `archived_at ${WHEN_OR_NULL}`,
      'PRIMARY KEY (team_id, id)',
      'KEY visits_start (team_id, nest_id, started_at)',
      within('nests', 'nest_id'),
      within('memberships', 'opened_by', 'user_id'),
    ],
  ],
  [
    'readings',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `nest_id ${ID}`,
      `visit_id ${ID}`,
      `kind ${WORD}`,
      `source ${WORD}`,
      `aid ${NAME_OR_NULL}`,
      `light ${NAME_OR_NULL}`,
      `opened_by ${ID}`,
      `opened_at ${WHEN}`,
      `opened_at_text ${NAME}`,
      `submitted_at ${WHEN_OR_NULL}`,
      `based_on ${ID_OR_NULL}`,
      'base_seq BIGINT NULL',
      'version INT NULL',
      'locked_version INT NULL',
      'PRIMARY KEY (team_id, id)',
      'UNIQUE KEY readings_based_on (team_id, based_on)',
      within('nests', 'nest_id'),
      within('visits', 'visit_id'),
      within('readings', 'based_on'),
      within('memberships', 'opened_by', 'user_id'),
    ],
  ],
  [
    'marks',
    [
      `team_id ${ID}`,
      `op_id ${ID}`,
      `reading_id ${ID}`,
      'seq BIGINT NOT NULL',
      'q SMALLINT NOT NULL',
      'r SMALLINT NOT NULL',
      `state ${WORD}`,
      'nectar BOOLEAN NOT NULL',
      'unsure BOOLEAN NOT NULL',
      'reused BOOLEAN NOT NULL',
      'scrap BOOLEAN NOT NULL',
      'instar TINYINT NULL',
      `note ${TEXT_OR_NULL}`,
      `supersedes ${ID_OR_NULL}`,
      `hlc ${CLOCK_TEXT}`,
      `at_text ${NAME}`,
      'PRIMARY KEY (team_id, op_id)',
      'KEY marks_reading (team_id, reading_id, seq)',
      within('readings', 'reading_id'),
      within('ops', 'op_id', 'op_id'),
    ],
  ],
  [
    'retractions',
    [
      `team_id ${ID}`,
      `op_id ${ID}`,
      `reading_id ${ID}`,
      `target ${ID}`,
      'seq BIGINT NOT NULL',
      'PRIMARY KEY (team_id, op_id)',
      'UNIQUE KEY retractions_target (team_id, target)',
      'KEY retractions_reading (team_id, reading_id)',
      within('readings', 'reading_id'),
      within('marks', 'target', 'op_id'),
      within('ops', 'op_id', 'op_id'),
    ],
  ],
  [
    'settlements',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `reading_id ${ID}`,
      'version INT NOT NULL',
      'position INT NOT NULL',
      'q SMALLINT NOT NULL',
      'r SMALLINT NOT NULL',
      `state ${WORD}`,
      'reason MEDIUMTEXT NOT NULL',
      `mark_op_id ${ID_OR_NULL}`,
      `actor_id ${ID}`,
      `created_at ${WHEN}`,
      'PRIMARY KEY (team_id, id)',
      'UNIQUE KEY settlements_order (team_id, reading_id, position)',
      within('readings', 'reading_id'),
      within('marks', 'mark_op_id', 'op_id'),
      within('memberships', 'actor_id', 'user_id'),
    ],
  ],
  [
    'outcomes',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `nest_id ${ID}`,
      `outcome ${NAME}`,
      'decided_on DATE NOT NULL',
      `note ${TEXT_OR_NULL}`,
      'PRIMARY KEY (team_id, id)',
      within('nests', 'nest_id'),
    ],
  ],
  [
    'estimates',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `nest_id ${ID}`,
      `input_digest ${HASH}`,
      `model_version ${WORD}`,
      'settings_version INT NOT NULL',
      'answer LONGTEXT NOT NULL',
      `created_at ${WHEN}`,
      'PRIMARY KEY (team_id, id)',
      'UNIQUE KEY estimates_input (team_id, nest_id, input_digest)',
      within('nests', 'nest_id'),
    ],
  ],
];

/** Tables whose rows are written once and never touched again; the database itself refuses the attempt. */
const APPEND_ONLY = ['ops', 'marks', 'retractions', 'settlements', 'audit_entries'] as const;

function appendOnlyTrigger(table: string, verb: 'UPDATE' | 'DELETE'): string {
  return (
    `CREATE TRIGGER ${table}_no_${verb.toLowerCase()} BEFORE ${verb} ON ${table} FOR EACH ROW ` +
    `SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = '${table} is append-only'`
  );
}

/** Creates every table of the main job: people, sync log, nests and their readings, settings, estimates. */
export async function up({ context }: { context: QueryInterface }): Promise<void> {
  const { sequelize } = context;
  for (const [name, lines] of TABLES) {
    await sequelize.query(
      `CREATE TABLE ${name} (${lines.join(', ')}) ENGINE=InnoDB DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`,
    );
  }
  for (const table of APPEND_ONLY) {
    await sequelize.query(appendOnlyTrigger(table, 'UPDATE'));
    await sequelize.query(appendOnlyTrigger(table, 'DELETE'));
  }
  await sequelize.query('INSERT INTO server_state (id, epoch) VALUES (1, 1)');
}

/** Drops everything `up` made, in reverse order. */
export async function down({ context }: { context: QueryInterface }): Promise<void> {
  for (const [name] of [...TABLES].reverse()) await context.sequelize.query(`DROP TABLE ${name}`);
}
