import { type QueryInterface, QueryTypes, type Sequelize, type Transaction } from 'sequelize';

const ID = 'BINARY(16) NOT NULL';
const WORD = 'VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL';

const SAMPLES = [
  `team_id ${ID}`,
  `id ${ID}`,
  'month CHAR(7) CHARACTER SET ascii COLLATE ascii_bin NOT NULL',
  `purpose ${WORD}`,
  `reading_id ${ID}`,
  'seed BIGINT NOT NULL',
  `drawn_by ${ID}`,
  'drawn_at DATETIME(3) NOT NULL',
  'PRIMARY KEY (team_id, id)',
  'UNIQUE KEY reading_samples_draw (team_id, month, purpose, reading_id)',
  'FOREIGN KEY (team_id, reading_id) REFERENCES readings (team_id, id)',
  'FOREIGN KEY (team_id, drawn_by) REFERENCES memberships (team_id, user_id)',
].join(', ');

type Value = string | number | boolean | null;
type Row = Record<string, Value>;

/** What the database gives: ids as lower-case hex, times as ISO 8601 text, so that nothing depends on a driver. */
interface Work {
  sequelize: Sequelize;
  transaction: Transaction;
}

const id = (column: string, name: string) =>
  `LOWER(INSERT(INSERT(INSERT(INSERT(HEX(${column}), 9, 0, '-'), 14, 0, '-'), 19, 0, '-'), 24, 0, '-')) AS ${name}`;
const time = (column: string, name: string) =>
  `CONCAT(LEFT(DATE_FORMAT(${column}, '%Y-%m-%dT%H:%i:%s.%f'), 23), 'Z') AS ${name}`;

const FINAL_COLUMNS = [
  id('id', 'id'),
  id('nest_id', 'nest'),
  id('visit_id', 'visit'),
  'kind, source, aid, light',
  id('opened_by', 'openedBy'),
  time('opened_at', 'openedAt'),
  'opened_at_text AS openedAtText',
  time('submitted_at', 'submittedAt'),
  id('based_on', 'basedOn'),
  'base_seq AS baseSeq, version, locked_version AS lockedVersion',
].join(', ');

const SETTLEMENT_COLUMNS = [
  id('id', 'id'),
  id('reading_id', 'reading'),
  'version, position, q, r, state, reason',
  id('mark_op_id', 'markOpId'),
  'pick',
  id('actor_id', 'actor'),
  time('created_at', 'createdAt'),
].join(', ');

const LOCK_COLUMNS = [
  id('reading_id', 'reading'),
  'version, LOWER(HEX(cells_hash)) AS cellsHash, settings_version AS settingsVersion, names',
  id('actor_id', 'actor'),
  time('locked_at', 'lockedAt'),
].join(', ');

const MARK_COLUMNS = [
  id('op_id', 'opId'),
  id('reading_id', 'reading'),
  'seq, q, r, state, nectar, unsure, reused, scrap, instar, note',
  id('supersedes', 'supersedes'),
  'hlc, at_text AS at',
].join(', ');

const RETRACTION_COLUMNS = [id('op_id', 'opId'), id('reading_id', 'reading'), id('target', 'target'), 'seq'].join(', ');

/** Members sorted by name, no white space: for text, whole numbers, yes and no this is RFC 8785. */
function canonical(value: Value | Row | readonly Row[] | Record<string, readonly Row[] | Row | Value>): string {
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  if (Array.isArray(value)) return `[${value.map((item: Row) => canonical(item)).join(',')}]`;
  const members = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1));
  return `{${members.map(([name, member]) => `${JSON.stringify(name)}:${canonical(member)}`).join(',')}}`;
}

async function sha256(...parts: Uint8Array<ArrayBuffer>[]): Promise<Buffer> {
  return Buffer.from(await globalThis.crypto.subtle.digest('SHA-256', Buffer.concat(parts)));
}

const bytes = (text: string) => new TextEncoder().encode(text);
const digest = async (value: Parameters<typeof canonical>[0]) =>
  (await sha256(bytes(canonical(value)))).toString('hex');
const binary = (uuid: string) => Buffer.from(uuid.replaceAll('-', ''), 'hex');

async function select<Found extends object>({ sequelize, transaction }: Work, sql: string, values: unknown[]) {
  return sequelize.query<Found>(sql, { type: QueryTypes.SELECT, replacements: values, transaction });
}

const yesNo = ({ nectar, unsure, reused, scrap, seq, ...row }: Row): Row => ({
  ...row,
  seq: Number(seq),
  nectar: Boolean(nectar),
  unsure: Boolean(unsure),
  reused: Boolean(reused),
  scrap: Boolean(scrap),
});

/** What a final reading is made of, hashed. */
async function sealOf(work: Work, team: Buffer, row: Row) {
  const final: Row = { ...row, baseSeq: row.baseSeq === null ? null : Number(row.baseSeq) };
  const behind = [team, binary(String(final.basedOn)), final.baseSeq ?? 0];
  const of = (columns: string, table: string) =>
    select<Row>(
      work,
      `SELECT ${columns} FROM ${table} WHERE team_id = ? AND reading_id = ? AND seq <= ? ORDER BY seq`,
      behind,
    );
  const own = [team, binary(String(final.id))];
  const settlements = await select<Row>(
    work,
    `SELECT ${SETTLEMENT_COLUMNS} FROM settlements WHERE team_id = ? AND reading_id = ? ORDER BY position`,
    own,
  );
  const locks = await select<Row>(
    work,
    `SELECT ${LOCK_COLUMNS} FROM reading_locks WHERE team_id = ? AND reading_id = ? ORDER BY version`,
    own,
  );
  const marks = (await of(MARK_COLUMNS, 'marks')).map(yesNo);
  const retractions = (await of(RETRACTION_COLUMNS, 'retractions')).map((taken) => ({
    ...taken,
    seq: Number(taken.seq),
  }));
  return {
    final: await digest(final),
    marks: await digest({ marks, retractions }),
    settled: await digest(settlements),
    settlements: settlements.length,
    locks: locks.length,
    locked: await digest(locks),
  };
}

/** Adds an entry that seals one final reading to the end of the team's chain. */
async function append(work: Work, team: Buffer, row: Row): Promise<void> {
  const [counter] = await select<{ seq: number; hash: Buffer; teamId: string; now: string }>(
    work,
    `SELECT audit_seq AS seq, audit_hash AS hash, ${id('team_id', 'teamId')}, ${time('UTC_TIMESTAMP(3)', 'now')}
       FROM team_counters WHERE team_id = ? FOR UPDATE`,
    [team],
  );
  if (!counter) return;
  const seq = Number(counter.seq) + 1;
  const detail = canonical({
    basedOn: row.basedOn ?? null,
    seal: await sealOf(work, team, row),
    version: row.version ?? null,
  });
  const link = {
    action: 'reading.seal',
    actorId: null,
    at: counter.now,
    detail,
    seq,
    subjectId: String(row.id),
    teamId: counter.teamId,
  };
  const hash = await sha256(new Uint8Array(counter.hash), bytes(canonical(link)));
  const { sequelize, transaction } = work;
  await sequelize.query(
    `INSERT INTO audit_entries (team_id, seq, at, actor_id, action, subject_id, detail, previous_hash, hash)
     VALUES (?, ?, ?, NULL, 'reading.seal', ?, ?, ?, ?)`,
    {
      replacements: [
        team,
        seq,
        counter.now.replace('T', ' ').replace('Z', ''),
        binary(link.subjectId),
        detail,
        counter.hash,
        hash,
      ],
      transaction,
    },
  );
  await sequelize.query('UPDATE team_counters SET audit_seq = ?, audit_hash = ? WHERE team_id = ?', {
    replacements: [seq, hash, team],
    transaction,
  });
}

/** Final readings decided before entries spoke of rows get an entry that seals them as they are now. */
async function sealOlder(sequelize: Sequelize): Promise<void> {
  await sequelize.transaction(async (transaction) => {
    const work = { sequelize, transaction };
    for (const { team } of await select<{ team: Buffer }>(
      work,
      'SELECT team_id AS team FROM team_counters ORDER BY team_id',
      [],
    )) {
      const rows = await select<Row>(
        work,
        `SELECT ${FINAL_COLUMNS} FROM readings f WHERE team_id = ? AND kind = 'final' AND NOT EXISTS
           (SELECT 1 FROM audit_entries a WHERE a.team_id = f.team_id AND a.subject_id = f.id
              AND JSON_VALUE(a.detail, '$.seal.final') IS NOT NULL)
          ORDER BY f.id`,
        [team],
      );
      for (const row of rows) await append(work, team, row);
    }
  });
}

/** Draws of readings to be read again, and an entry in the audit chain for every final reading from before seals. */
export async function up({ context }: { context: QueryInterface }): Promise<void> {
  const { sequelize } = context;
  await sequelize.query(
    `CREATE TABLE reading_samples (${SAMPLES}) ENGINE=InnoDB DEFAULT CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`,
  );
  await sealOlder(sequelize);
}

/** Drops the draws. Entries of the chain stay: it can only grow. */
export async function down({ context }: { context: QueryInterface }): Promise<void> {
  await context.sequelize.query('DROP TABLE reading_samples');
}
