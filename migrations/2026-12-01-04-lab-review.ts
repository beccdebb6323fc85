import type { QueryInterface } from 'sequelize';

const ID = 'BINARY(16) NOT NULL';
const WHEN = 'DATETIME(3) NOT NULL';

/** A foreign key within one team. */
function within(table: string, column: string, key = 'id'): string {
  return `FOREIGN KEY (team_id, ${column}) REFERENCES ${table} (team_id, ${key})`;
}

const TABLES: readonly [name: string, lines: readonly string[]][] = [
  [
    'review_claims',
    [
      `team_id ${ID}`,
      `visit_id ${ID}`,
      `user_id ${ID}`,
      `claimed_at ${WHEN}`,
      'PRIMARY KEY (team_id, visit_id)',
      'KEY review_claims_user (team_id, user_id)',
      within('visits', 'visit_id'),
      within('memberships', 'user_id', 'user_id'),
    ],
  ],
  [
    'primary_choices',
    [
      `team_id ${ID}`,
      `visit_id ${ID}`,
      'position INT NOT NULL',
      `reading_id ${ID}`,
      'reason MEDIUMTEXT NOT NULL',
      `actor_id ${ID}`,
      `chosen_at ${WHEN}`,
      'PRIMARY KEY (team_id, visit_id, position)',
      within('visits', 'visit_id'),
      within('readings', 'reading_id'),
      within('memberships', 'actor_id', 'user_id'),
    ],
  ],
  [
    'reading_locks',
    [
      `team_id ${ID}`,
      `reading_id ${ID}`,
      'version INT NOT NULL',
      'cells_hash BINARY(32) NOT NULL',
      'settings_version INT NOT NULL',
      'names MEDIUMTEXT NOT NULL',
      `actor_id ${ID}`,
      `locked_at ${WHEN}`,
      'PRIMARY KEY (team_id, reading_id, version)',
      within('readings', 'reading_id'),
      within('memberships', 'actor_id', 'user_id'),
    ],
  ],
];

/** Rows written once and never touched again; the database itself refuses the attempt. */
const APPEND_ONLY = ['primary_choices', 'reading_locks'] as const;

function appendOnlyTrigger(table: string, verb: 'UPDATE' | 'DELETE'): string {
  return (
    `CREATE TRIGGER ${table}_no_${verb.toLowerCase()} BEFORE ${verb} ON ${table} FOR EACH ROW ` +
    `SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = '${table} is append-only'`
  );
}

/** The lab's bench: who reads a comb a second time, which field reading counts, what was locked, whose view a settlement took. */
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
  await sequelize.query(
    'ALTER TABLE settlements ADD COLUMN pick VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NULL',
  );
}

/** Takes back everything `up` made, in reverse order. */
export async function down({ context }: { context: QueryInterface }): Promise<void> {
  await context.sequelize.query('ALTER TABLE settlements DROP COLUMN pick');
  for (const [name] of [...TABLES].reverse()) await context.sequelize.query(`DROP TABLE ${name}`);
}
