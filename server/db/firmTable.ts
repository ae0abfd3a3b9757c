import {
  Op,
  type Attributes,
  type CreationAttributes,
  type FindOptions,
  type Model,
  type ModelStatic,
  type Transaction,
  type WhereOptions,
} from 'sequelize';

type Find<M extends Model> = Pick<FindOptions<Attributes<M>>, 'attributes' | 'order' | 'limit'> & {
  /** `update`: the row is about to change; `share`: it must not change meanwhile. */
  lock?: 'update' | 'share';
};

/** A model bound to one firm and one transaction. There is no way to reach another firm's rows through it. */
export class FirmTable<M extends Model> {
  readonly #model: ModelStatic<M>;
  readonly #firmId: string;
  readonly #transaction: Transaction;

  constructor(model: ModelStatic<M>, firmId: string, transaction: Transaction) {
    this.#model = model;
    this.#firmId = firmId;
    this.#transaction = transaction;
  }

  /** Rows of the firm that match. */
  async all(where: WhereOptions<Attributes<M>>, find: Find<M> = {}): Promise<M[]> {
    const { lock, ...rest } = find;
    return this.#model.findAll({
      ...rest,
      where: this.#within(where),
      transaction: this.#transaction,
      ...(lock
        ? { lock: lock === 'update' ? this.#transaction.LOCK.UPDATE : this.#transaction.LOCK.SHARE }
        : {}),
    });
  }

  /** The one row that matches, or null. */
  async one(where: WhereOptions<Attributes<M>>, find: Find<M> = {}): Promise<M | null> {
    const [row] = await this.all(where, { ...find, limit: 1 });
    return row ?? null;
  }

  /** Adds a row of the firm. */
  async add(values: CreationAttributes<M>): Promise<M> {
    return this.#model.create({ ...values, firmId: this.#firmId }, { transaction: this.#transaction });
  }

  /** Adds many rows of the firm in one statement. */
  async addMany(values: readonly CreationAttributes<M>[]): Promise<void> {
    const rows = values.map((each) => ({ ...each, firmId: this.#firmId }));
    await this.#model.bulkCreate(rows, { transaction: this.#transaction });
  }

  /** Changes a row that came through this table. */
  async change(row: M, values: Partial<Attributes<M>>): Promise<void> {
    await row.update(values, { transaction: this.#transaction });
  }

  #within(where: WhereOptions<Attributes<M>>): WhereOptions<Attributes<M>> {
    const firm: WhereOptions = { firmId: this.#firmId };
    return { [Op.and]: [where, firm] } as WhereOptions<Attributes<M>>;
  }
}
