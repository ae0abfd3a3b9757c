import { DataTypes, type Model, type ModelAttributes, type ModelStatic, type Sequelize } from 'sequelize';
import type {
  BasisRow,
  EditionRemarkRow,
  EditionRow,
  EditionVersionRow,
  FirmRow,
  MemberRow,
  MembershipRow,
  MemberVersionRow,
  PersonRow,
  ProjectRow,
  ResultRow,
  SectionRow,
  StockListRow,
  TrailRow,
} from './rows.ts';

const id = { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 };
const uuid = DataTypes.UUID;
const text = DataTypes.TEXT;
const whole = DataTypes.INTEGER;
const number = DataTypes.DOUBLE;
const yes = DataTypes.BOOLEAN;
const json = DataTypes.JSONB;
/** Left to the database's default when not given. */
const instant = DataTypes.DATE;

/** The models of one connection. Only the door hands them out, bound to a firm and a transaction. */
export function defineModels(sequelize: Sequelize) {
  function table<M extends Model>(name: string, attributes: ModelAttributes<M>): ModelStatic<M> {
    return sequelize.define<M>(name, attributes, { tableName: name, timestamps: false, underscored: true });
  }
  return {
    firms: table<FirmRow>('firms', { id, name: text, invented: yes, solePractitioner: yes }),
    people: table<PersonRow>('people', { id, email: text, name: text }),
    memberships: table<MembershipRow>('memberships', {
      id,
      firmId: uuid,
      personId: uuid,
      roles: DataTypes.ARRAY(text),
      active: yes,
    }),
    bases: table<BasisRow>('bases', {
      id,
      firmId: uuid,
      title: text,
      purpose: text,
      createdBy: uuid,
      createdAt: instant,
    }),
    editions: table<EditionRow>('editions', {
      id,
      firmId: uuid,
      basisId: uuid,
      number: whole,
      state: text,
      document: json,
      hash: text,
      unverified: whole,
      reason: text,
      version: whole,
      draftedBy: uuid,
      draftedAt: instant,
      submittedBy: uuid,
      releasedBy: uuid,
      releasedAt: instant,
    }),
    editionVersions: table<EditionVersionRow>('edition_versions', {
      id,
      firmId: uuid,
      editionId: uuid,
      version: whole,
      undo: json,
      changedBy: uuid,
      changedAt: instant,
    }),
    editionRemarks: table<EditionRemarkRow>('edition_remarks', {
      id,
      firmId: uuid,
      editionId: uuid,
      pointer: text,
      text,
      remarkedBy: uuid,
      remarkedAt: instant,
    }),
    stockLists: table<StockListRow>('stock_lists', {
      id,
      firmId: uuid,
      title: text,
      note: text,
      invented: yes,
      units: text,
      currency: text,
      changedAt: instant,
    }),
    sections: table<SectionRow>('sections', {
      id,
      firmId: uuid,
      stockListId: uuid,
      key: text,
      nominalB: number,
      nominalH: number,
      actualB: number,
      actualH: number,
      lengths: DataTypes.ARRAY(number),
      grades: DataTypes.ARRAY(text),
      pricePerMetre: number,
    }),
    projects: table<ProjectRow>('projects', {
      id,
      firmId: uuid,
      title: text,
      site: text,
      client: text,
      state: text,
      editionId: uuid,
      stockListId: uuid,
      choices: json,
      version: whole,
      createdBy: uuid,
      createdAt: instant,
      changedAt: instant,
    }),
    members: table<MemberRow>('members', {
      id,
      firmId: uuid,
      projectId: uuid,
      mark: text,
      state: text,
      document: json,
      hash: text,
      version: whole,
      savedBy: uuid,
      savedAt: instant,
    }),
    memberVersions: table<MemberVersionRow>('member_versions', {
      memberId: { type: uuid, primaryKey: true },
      version: { type: whole, primaryKey: true },
      firmId: uuid,
      document: json,
      hash: text,
      savedBy: uuid,
      savedAt: instant,
    }),
    results: table<ResultRow>('results', {
      id,
      firmId: uuid,
      memberId: uuid,
      memberVersion: whole,
      editionId: uuid,
      editionHash: text,
      inputs: json,
      memberHash: text,
      engine: text,
      document: json,
      resultHash: text,
      verdict: text,
      governingCheck: text,
      checkTitle: text,
      utilisation: number,
      because: text,
      unverified: whole,
      departures: whole,
      at: instant,
    }),
    trail: table<TrailRow>('trail', {
      // Given by the database.
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true, autoIncrementIdentity: true },
      firmId: uuid,
      at: instant,
      personId: uuid,
      kind: text,
      subjectType: text,
      subjectId: uuid,
      subjectLabel: text,
      event: json,
    }),
  };
}
export type Models = ReturnType<typeof defineModels>;
