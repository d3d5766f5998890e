import {
  DataTypes,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Model,
  type ModelStatic,
  type Sequelize,
} from 'sequelize';
import type { ExportState } from '../../shared/api/exports';
import type { Role } from '../../shared/api/roles';
import type { Visibility } from '../../shared/api/strips';

/** Rows as they lie in the tables; the migrations say what each column means. */

type Row<Self extends Model> = Model<InferAttributes<Self>, InferCreationAttributes<Self>>;

export interface DepartmentRow extends Row<DepartmentRow> {
  id: string;
  organisation: string;
  name: string;
}

export interface UserRow extends Row<UserRow> {
  id: string;
  departmentId: string;
  name: string;
  email: string;
  role: Role;
  passwordHash: string;
  isDemo: CreationOptional<number>;
  createdAt: string;
}

export interface SessionRow extends Row<SessionRow> {
  id: string;
  userId: string;
  createdAt: string;
  expiresAt: string;
}

export interface StripRow extends Row<StripRow> {
  id: string;
  ownerId: string | null;
  departmentId: string | null;
  visibility: Visibility;
  title: string;
  titleKey: string;
  teachingPoint: string;
  groupId: string | null;
  coursePosition: CreationOptional<number | null>;
  /** JSON. */
  parameters: string;
  searchText: string;
  version: number;
  /** The engine that it was last saved with. */
  engineVersion: CreationOptional<string>;
  presetId: CreationOptional<string | null>;
  shippedStamp: CreationOptional<string | null>;
  createdAt: string;
  updatedAt: string;
  deletedAt: CreationOptional<string | null>;
}

export interface StripTagRow extends Row<StripTagRow> {
  stripId: string;
  position: number;
  tag: string;
  tagKey: string;
}

export interface ExportJobRow extends Row<ExportJobRow> {
  id: string;
  ownerId: string;
  stripId: string | null;
  title: string;
  /** JSON. */
  parameters: string;
  /** JSON. */
  formats: string;
  durationS: number;
  bundle: number;
  state: ExportState;
  attempts: CreationOptional<number>;
  failure: CreationOptional<string | null>;
  /** JSON. */
  warnings: CreationOptional<string>;
  ending: CreationOptional<string | null>;
  mediaType: CreationOptional<string | null>;
  bytes: CreationOptional<number | null>;
  createdAt: string;
  finishedAt: CreationOptional<string | null>;
  removedAt: CreationOptional<string | null>;
}

export interface Models {
  departments: ModelStatic<DepartmentRow>;
  users: ModelStatic<UserRow>;
  sessions: ModelStatic<SessionRow>;
  strips: ModelStatic<StripRow>;
  stripTags: ModelStatic<StripTagRow>;
  exportJobs: ModelStatic<ExportJobRow>;
}

// Sequelize writes into the attributes it is given, so each column gets its own.
const key = () => ({ type: DataTypes.TEXT, primaryKey: true });
const text = () => ({ type: DataTypes.TEXT, allowNull: false });
const optionalText = () => ({ type: DataTypes.TEXT });
const integer = () => ({ type: DataTypes.INTEGER, allowNull: false });
const optionalInteger = () => ({ type: DataTypes.INTEGER });

/** Binds the tables to one connection pool; called once per open database. */
export function defineModels(sequelize: Sequelize): Models {
  return {
    departments: sequelize.define<DepartmentRow>('departments', {
      id: key(),
      organisation: text(),
      name: text(),
    }),
    users: sequelize.define<UserRow>('users', {
      id: key(),
      departmentId: text(),
      name: text(),
      email: text(),
      role: text(),
      passwordHash: text(),
      isDemo: { ...integer(), defaultValue: 0 },
      createdAt: text(),
    }),
    sessions: sequelize.define<SessionRow>('sessions', {
      id: key(),
      userId: text(),
      createdAt: text(),
      expiresAt: text(),
    }),
    strips: sequelize.define<StripRow>('strips', {
      id: key(),
      ownerId: optionalText(),
      departmentId: optionalText(),
      visibility: text(),
      title: text(),
      titleKey: text(),
      teachingPoint: text(),
      groupId: optionalText(),
      coursePosition: optionalInteger(),
      parameters: text(),
      searchText: text(),
      version: integer(),
      engineVersion: { ...text(), defaultValue: '1.0.0' },
      presetId: optionalText(),
      shippedStamp: optionalText(),
      createdAt: text(),
      updatedAt: text(),
      deletedAt: optionalText(),
    }),
    stripTags: sequelize.define<StripTagRow>('strip_tags', {
      stripId: { ...text(), primaryKey: true },
      position: integer(),
      tag: text(),
      tagKey: { ...text(), primaryKey: true },
    }),
    exportJobs: sequelize.define<ExportJobRow>('export_jobs', {
      id: key(),
      ownerId: text(),
      stripId: optionalText(),
      title: text(),
      parameters: text(),
      formats: text(),
      durationS: { type: DataTypes.REAL, allowNull: false },
      bundle: integer(),
      state: text(),
      attempts: { ...integer(), defaultValue: 0 },
      failure: optionalText(),
      warnings: { ...text(), defaultValue: '[]' },
      ending: optionalText(),
      mediaType: optionalText(),
      bytes: optionalInteger(),
      createdAt: text(),
      finishedAt: optionalText(),
      removedAt: optionalText(),
    }),
  };
}
