import type { QueryInterface } from 'sequelize';

const ID = 'BINARY(16) NOT NULL';
const ID_OR_NULL = 'BINARY(16) NULL';
const WHEN = 'DATETIME(3) NOT NULL';
const WHEN_OR_NULL = 'DATETIME(3) NULL';
const WORD = 'VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL';
const NAME_OR_NULL = 'VARCHAR(200) COLLATE utf8mb4_nopad_bin NULL';

/** A foreign key within one team. */
function within(table: string, column: string, key = 'id'): string {
  return `FOREIGN KEY (team_id, ${column}) REFERENCES ${table} (team_id, ${key})`;
}

const TABLES: readonly [name: string, lines: readonly string[]][] = [
  [
    'temperatures',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `nest_id ${ID}`,
      `kind ${WORD}`,
      `source ${WORD}`,
      `file_name ${NAME_OR_NULL}`,
      'raw LONGTEXT NOT NULL',
      'raw_hash BINARY(32) NOT NULL',
      'answers LONGTEXT NOT NULL',
      'size INT NOT NULL',
      `from_at ${WHEN}`,
      `to_at ${WHEN}`,
      `kept_by ${ID}`,
      `kept_at ${WHEN}`,
      `removed_by ${ID_OR_NULL}`,
      `removed_at ${WHEN_OR_NULL}`,
      'removed_reason MEDIUMTEXT NULL',
      'PRIMARY KEY (team_id, id)',
      'KEY temperatures_nest (team_id, nest_id, kept_at)',
      within('nests', 'nest_id'),
      within('memberships', 'kept_by', 'user_id'),
      within('memberships', 'removed_by', 'user_id'),
    ],
  ],
  [
    'temperature_readings',
    [
      `team_id ${ID}`,
      `temperature_id ${ID}`,
      `at ${WHEN}`,
      'celsius DOUBLE NOT NULL',
      'PRIMARY KEY (team_id, temperature_id, at)',
      within('temperatures', 'temperature_id'),
    ],
  ],
  [
    'temperature_days',
    [
      `team_id ${ID}`,
      `temperature_id ${ID}`,
      'date CHAR(10) CHARACTER SET ascii COLLATE ascii_bin NOT NULL',
      'min_c DOUBLE NOT NULL',
      'max_c DOUBLE NOT NULL',
      'PRIMARY KEY (team_id, temperature_id, date)',
      within('temperatures', 'temperature_id'),
    ],
  ],
  [
    'settings_drafts',
    [
      `team_id ${ID} PRIMARY KEY`,
      'based_on INT NOT NULL',
      'settings LONGTEXT NOT NULL',
      `edited_by ${ID}`,
      `edited_at ${WHEN}`,
      within('memberships', 'edited_by', 'user_id'),
    ],
  ],
];

/** Tables whose rows are written once; a record that no longer counts is marked, its values stay. */
const APPEND_ONLY = ['temperature_readings', 'temperature_days', 'settings_versions', 'duration_sets'] as const;
const VERBS = ['UPDATE', 'DELETE'] as const;

function trigger(table: string, verb: (typeof VERBS)[number]): string {
  return `${table}_no_${verb.toLowerCase()}`;
}

/** Temperature records of nests with their values, the draft of the settings, and why a version was signed. */
export async function up({ context }: { context: QueryInterface }): Promise<void> {
  const { sequelize } = context;
  for (const [name, lines] of TABLES) {
    await sequelize.query(
      `CREATE TABLE ${name} (${lines.join(', ')}) ENGINE=InnoDB DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`,
    );
  }
  await sequelize.query('ALTER TABLE settings_versions ADD COLUMN reason MEDIUMTEXT NULL AFTER signed_at');
  for (const table of APPEND_ONLY) {
    for (const verb of VERBS) {
      await sequelize.query(
        `CREATE TRIGGER ${trigger(table, verb)} BEFORE ${verb} ON ${table} FOR EACH ROW ` +
          `SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = '${table} is append-only'`,
      );
    }
  }
}

/** Takes all of it back, in reverse order. */
export async function down({ context }: { context: QueryInterface }): Promise<void> {
  const { sequelize } = context;
  for (const table of APPEND_ONLY) {
    for (const verb of VERBS) await sequelize.query(`DROP TRIGGER ${trigger(table, verb)}`);
  }
  await sequelize.query('ALTER TABLE settings_versions DROP COLUMN reason');
  for (const [name] of [...TABLES].reverse()) await sequelize.query(`DROP TABLE ${name}`);
}
