import type { QueryInterface } from 'sequelize';

const ID = 'BINARY(16) NOT NULL';
const ID_OR_NULL = 'BINARY(16) NULL';
const WHEN = 'DATETIME(3) NOT NULL';
const WHEN_OR_NULL = 'DATETIME(3) NULL';
const WORD = 'VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL';
const WORD_OR_NULL = 'VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NULL';
const HASH = 'BINARY(32) NOT NULL';
const NAME = 'VARCHAR(200) COLLATE utf8mb4_nopad_bin NOT NULL';
const NAME_OR_NULL = 'VARCHAR(200) COLLATE utf8mb4_nopad_bin NULL';

/** A foreign key to a member of the same team. */
function member(column: string): string {
  return `FOREIGN KEY (team_id, ${column}) REFERENCES memberships (team_id, user_id)`;
}

const TABLES: readonly [name: string, lines: readonly string[]][] = [
  [
    'invitations',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `email ${NAME}`,
      `role ${WORD}`,
      // Null for the first coordinator of a team, whom the person at the machine invites.
      `invited_by ${ID_OR_NULL}`,
      `token_hash ${HASH}`,
      `invited_at ${WHEN}`,
      `expires_at ${WHEN}`,
      `accepted_at ${WHEN_OR_NULL}`,
      `withdrawn_at ${WHEN_OR_NULL}`,
      'PRIMARY KEY (team_id, id)',
      'UNIQUE KEY invitations_token (token_hash)',
      'KEY invitations_email (team_id, email)',
      'FOREIGN KEY (team_id) REFERENCES teams (id)',
      member('invited_by'),
    ],
  ],
  [
    'reset_tokens',
    [
      'token_hash BINARY(32) NOT NULL PRIMARY KEY',
      `user_id ${ID}`,
      `expires_at ${WHEN}`,
      `used_at ${WHEN_OR_NULL}`,
      'KEY reset_tokens_user (user_id)',
      'FOREIGN KEY (user_id) REFERENCES users (id)',
    ],
  ],
  [
    'letters',
    [
      `team_id ${ID}`,
      `id ${ID}`,
      `kind ${WORD}`,
      `recipient ${NAME}`,
      `subject_id ${ID}`,
      `written_at ${WHEN}`,
      `sent_at ${WHEN_OR_NULL}`,
      `failure ${WORD_OR_NULL}`,
      'PRIMARY KEY (team_id, id)',
      'KEY letters_subject (team_id, subject_id)',
      'FOREIGN KEY (team_id) REFERENCES teams (id)',
    ],
  ],
];

const COLUMNS: readonly [table: string, column: string, type: string][] = [
  ['memberships', 'ended_at', WHEN_OR_NULL],
  ['sessions', 'agent', "VARCHAR(200) COLLATE utf8mb4_nopad_bin NOT NULL DEFAULT ''"],
  ['devices', 'unsent', 'INT NULL'],
  ['devices', 'revoked_by', ID_OR_NULL],
  ['devices', 'revoke_reason', NAME_OR_NULL],
];

/** Members can be invited and can leave, letters are noted, sessions say what browser they are in, phones what they hold. */
export async function up({ context }: { context: QueryInterface }): Promise<void> {
  const { sequelize } = context;
  for (const [table, column, type] of COLUMNS) {
    await sequelize.query(`ALTER TABLE ${table} ADD COLUMN ${column} ${type}`);
  }
  await sequelize.query('ALTER TABLE sessions ADD KEY sessions_user (user_id, last_seen_at)');
  for (const [name, lines] of TABLES) {
    await sequelize.query(
      `CREATE TABLE ${name} (${lines.join(', ')}) ENGINE=InnoDB DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`,
    );
  }
}

/**
 * Drops everything `up` made, in reverse order. Former members keep a role word that no version knows, so that taking
 * this back opens nothing to them.
 */
export async function down({ context }: { context: QueryInterface }): Promise<void> {
  const { sequelize } = context;
  await sequelize.query("UPDATE memberships SET role = 'former' WHERE ended_at IS NOT NULL");
  for (const [name] of [...TABLES].reverse()) await sequelize.query(`DROP TABLE ${name}`);
  await sequelize.query('ALTER TABLE sessions DROP KEY sessions_user');
  for (const [table, column] of [...COLUMNS].reverse()) {
    await sequelize.query(`ALTER TABLE ${table} DROP COLUMN ${column}`);
  }
}
