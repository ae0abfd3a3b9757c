import { QueryTypes, type Model, type ModelStatic, type Sequelize, type Transaction } from 'sequelize';
import type { SubjectType, TrailEvent } from '#shared/trail/index.ts';
import { defineModels, type Models } from '#server/models/define.ts';
import type { FirmRow } from '#server/models/rows.ts';
import type { Database } from './connection.ts';
import { FirmTable } from './firmTable.ts';

/** What an event on the trail is about. */
export interface Subject {
  type: SubjectType;
  id: string;
  label: string;
}

export interface Who {
  firmId: string;
  personId: string;
}

export interface Manner {
  /** The database refuses every write of this transaction. */
  readOnly?: boolean;
}

/** The one door to a firm's data: bound to one firm, one person and one transaction. */
export type Door = ReturnType<typeof doorFor>;

/**
 * Opens the door to one firm's data for the length of one transaction. Row-level security is set for the
 * transaction by the same call; what a query asks beyond the firm does not exist for it. A write on an
 * audited table without an event recorded through `record` fails at commit, and nothing is kept.
 */
export async function withFirm<T>(
  database: Database,
  who: Who,
  work: (door: Door) => Promise<T>,
  { readOnly = false }: Manner = {},
): Promise<T> {
  return database.sequelize.transaction(async (transaction) => {
    const done = await work(await openDoor(database, transaction, who, { readOnly }));
    // Asks for the trail now, while the transaction can still be undone in the ordinary way.
    if (!readOnly) await database.sequelize.query('SET CONSTRAINTS ALL IMMEDIATE', { transaction });
    return done;
  });
}

/** The door within a transaction that is already there; only for setting up firms. */
export async function openDoor(
  database: Database,
  transaction: Transaction,
  who: Who,
  { readOnly = false }: Manner = {},
): Promise<Door> {
  await bind(database, transaction, who.firmId, who.personId, readOnly);
  return doorFor(database, transaction, who);
}

/** Firms that a person belongs to, asked before any firm is known: the only query outside a firm. */
export async function firmsOf(database: Database, personId: string): Promise<string[]> {
  return database.sequelize.transaction(async (transaction) => {
    await bind(database, transaction, '', personId, true);
    const rows = await database.sequelize.query<{ firm_id: string }>(
      `SELECT firm_id FROM memberships WHERE active AND cardinality(roles) > 0 ORDER BY created_at, id`,
      { transaction, type: QueryTypes.SELECT },
    );
    return rows.map(({ firm_id }) => firm_id);
  });
}

async function bind(
  { sequelize }: Database,
  transaction: Transaction,
  firmId: string,
  personId: string,
  readOnly: boolean,
): Promise<void> {
  const settings = `SELECT set_config('app.firm_id', $1, true), set_config('app.person_id', $2, true)`;
  await sequelize.query(
    readOnly ? `${settings}, set_config('transaction_read_only', 'on', true)` : settings,
    { bind: [firmId, personId], transaction, type: QueryTypes.SELECT },
  );
}

/** Models of each connection. They stay in here: whoever wants rows has to come through the door. */
const defined = new WeakMap<Sequelize, Models>();

function modelsOf(sequelize: Sequelize): Models {
  const known = defined.get(sequelize) ?? defineModels(sequelize);
  defined.set(sequelize, known);
  return known;
}

function doorFor({ sequelize }: Database, transaction: Transaction, { firmId, personId }: Who) {
  const models = modelsOf(sequelize);
  const table = <M extends Model>(model: ModelStatic<M>) => new FirmTable(model, firmId, transaction);
  return {
    firmId,
    personId,
    memberships: table(models.memberships),
    bases: table(models.bases),
    editions: table(models.editions),
    editionVersions: table(models.editionVersions),
    editionRemarks: table(models.editionRemarks),
    stockLists: table(models.stockLists),
    sections: table(models.sections),
    projects: table(models.projects),
    members: table(models.members),
    memberVersions: table(models.memberVersions),
    results: table(models.results),
    trail: table(models.trail),

    /** The firm itself. */
    async firm(): Promise<FirmRow> {
      const firm = await models.firms.findOne({ where: { id: firmId }, transaction });
      if (!firm) throw new Error('The firm of an open door does not exist.');
      return firm;
    },

    /** Reads with SQL, for lists that join; `:name` in the text is replaced, never spliced. */
    async select<T extends object>(sql: string, replacements: Record<string, unknown> = {}): Promise<T[]> {
      return sequelize.query<T>(sql, {
        replacements: { ...replacements, firmId },
        transaction,
        type: QueryTypes.SELECT,
      });
    },

    /** Puts an event on the trail, in the same transaction as what it tells of. */
    async record(event: TrailEvent, subject: Subject): Promise<void> {
      await models.trail.create(
        {
          firmId,
          personId,
          kind: event.kind,
          subjectType: subject.type,
          subjectId: subject.id,
          subjectLabel: subject.label,
          event,
        },
        { transaction },
      );
    },
  };
}
