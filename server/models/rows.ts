import type { Operation } from 'fast-json-patch';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Model } from 'sequelize';
import type { MemberState, ProjectState, Role } from '#shared/access/index.ts';
import type { EditionState } from '#shared/basis/lifecycle.ts';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import type { Result, VerdictWord } from '#shared/engine/types.ts';
import type { SubjectType, TrailEvent } from '#shared/trail/index.ts';

type Row<M extends Model> = Model<InferAttributes<M>, InferCreationAttributes<M>>;
/** Filled by the door (`firmId`) or the database. */
type Given<T> = CreationOptional<T>;

export interface FirmRow extends Row<FirmRow> {
  id: Given<string>;
  name: string;
  invented: Given<boolean>;
  solePractitioner: Given<boolean>;
}

export interface MembershipRow extends Row<MembershipRow> {
  id: Given<string>;
  firmId: Given<string>;
  personId: string;
  roles: Role[];
  active: Given<boolean>;
}

export interface PersonRow extends Row<PersonRow> {
  id: Given<string>;
  email: string;
  name: string;
}

export interface BasisRow extends Row<BasisRow> {
  id: Given<string>;
  firmId: Given<string>;
  title: string;
  purpose: Given<string>;
  createdBy: string;
  createdAt: Given<Date>;
}

export interface EditionRow extends Row<EditionRow> {
  id: Given<string>;
  firmId: Given<string>;
  basisId: string;
  number: number;
  state: Given<EditionState>;
  document: Edition;
  hash: string;
  unverified: number;
  reason: Given<string>;
  version: Given<number>;
  draftedBy: string;
  draftedAt: Given<Date>;
  submittedBy: Given<string | null>;
  releasedBy: Given<string | null>;
  releasedAt: Given<Date | null>;
}

/** A save of a draft: the way back to the version before it. */
export interface EditionVersionRow extends Row<EditionVersionRow> {
  id: Given<string>;
  firmId: Given<string>;
  editionId: string;
  version: number;
  undo: Operation[];
  changedBy: string;
  changedAt: Given<Date>;
}

export interface EditionRemarkRow extends Row<EditionRemarkRow> {
  id: Given<string>;
  firmId: Given<string>;
  editionId: string;
  pointer: string;
  text: string;
  remarkedBy: string;
  remarkedAt: Given<Date>;
}

export interface StockListRow extends Row<StockListRow> {
  id: Given<string>;
  firmId: Given<string>;
  title: string;
  note: Given<string>;
  invented: Given<boolean>;
  units: Member['units'];
  currency: Given<string | null>;
  changedAt: Given<Date>;
}

export interface SectionRow extends Row<SectionRow> {
  id: Given<string>;
  firmId: Given<string>;
  stockListId: string;
  key: string;
  nominalB: number;
  nominalH: number;
  actualB: number;
  actualH: number;
  lengths: Given<number[]>;
  grades: Given<string[]>;
  pricePerMetre: Given<number | null>;
}

export interface ProjectRow extends Row<ProjectRow> {
  id: Given<string>;
  firmId: Given<string>;
  title: string;
  site: Given<string>;
  client: Given<string>;
  state: Given<ProjectState>;
  editionId: Given<string | null>;
  stockListId: Given<string | null>;
  choices: Given<Record<string, string>>;
  version: Given<number>;
  createdBy: string;
  createdAt: Given<Date>;
  changedAt: Given<Date>;
}

export interface MemberRow extends Row<MemberRow> {
  id: Given<string>;
  firmId: Given<string>;
  projectId: string;
  mark: string;
  state: Given<MemberState>;
  document: Member;
  hash: string;
  version: Given<number>;
  savedBy: string;
  savedAt: Given<Date>;
}

export interface MemberVersionRow extends Row<MemberVersionRow> {
  memberId: string;
  version: number;
  firmId: Given<string>;
  document: Member;
  hash: string;
  savedBy: string;
  savedAt: Given<Date>;
}

export interface ResultRow extends Row<ResultRow> {
  id: Given<string>;
  firmId: Given<string>;
  memberId: string;
  memberVersion: number;
  editionId: string;
  editionHash: string;
  inputs: Member;
  memberHash: string;
  engine: string;
  document: Result;
  resultHash: string;
  verdict: VerdictWord;
  governingCheck: string | null;
  checkTitle: string | null;
  utilisation: number | null;
  because: string | null;
  unverified: number;
  departures: number;
  at: Given<Date>;
}

export interface TrailRow extends Row<TrailRow> {
  id: Given<string>;
  firmId: Given<string>;
  at: Given<Date>;
  personId: string;
  kind: TrailEvent['kind'];
  subjectType: SubjectType;
  subjectId: string;
  subjectLabel: string;
  event: TrailEvent;
}
