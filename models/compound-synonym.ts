import { type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';
import { idColumn, textColumn, uuidColumn } from './columns';

/** Another name under which a compound is looked up. */
export class CompoundSynonym extends Model<
  InferAttributes<CompoundSynonym>,
  InferCreationAttributes<CompoundSynonym>
> {
  declare id: string;
  declare compoundId: string;
  declare name: string;
}

export function initCompoundSynonym(sequelize: Sequelize): void {
  CompoundSynonym.init(
    {
      id: idColumn(),
      compoundId: uuidColumn(),
      name: textColumn(),
    },
    { sequelize, modelName: 'CompoundSynonym', tableName: 'compound_synonyms', timestamps: false },
  );
}
