import { randomUUID } from 'node:crypto';
import { Op, type Transaction } from 'sequelize';
import type { z } from 'zod';
import type { keptEndpoints } from '../../shared/api/farms.ts';
import { audit, differences } from '../accounts/audit.ts';
import { inTransaction } from '../database/connection.ts';
import { invalid, notFound, type ProblemItem } from '../http/problem.ts';
import { signedIn, type Register } from '../http/route.ts';
import { snapshot, type Table } from '../models/table.ts';
import type { Services } from '../services.ts';
import { changedMeanwhile, type Stamped } from './changes.ts';
import type { Reassess } from './reassess.ts';

/** What every stored thing of a farm has, as the database keeps it. */
export interface KeptRow extends Stamped {
  id: string;
  farmId: string;
  name: string;
  version: number;
}

type Body = z.ZodObject<{ name: z.ZodString }>;

/** How one kind of thing is kept, beside what all kinds share. */
export interface Keeping<Row extends KeptRow, Input extends { name: string }, Answer> {
  table: Table<Row>;
  /** Rules that the schema alone cannot tell, such as things referred to. */
  check?(input: Input, farmId: string, transaction: Transaction): Promise<ProblemItem[]>;
  /** The part of the input that is columns of the table itself. */
  columns(input: Input): Partial<Row>;
  /** Rows beside the table. */
  afterWrite?(id: string, input: Input, transaction: Transaction): Promise<void>;
  /** Columns whose change goes into the audit trail. */
  audited?: readonly string[];
  /** For columns not given by people. */
  defaults?: Partial<Row>;
  present(rows: Row[], transaction: Transaction | null): Promise<Answer[]>;
}

const archivedWhere = { no: { archivedAt: null }, yes: { archivedAt: { [Op.ne]: null } }, all: {} } as const;

/** Registers list, read, create, update and archive of one kind of thing. `changed` runs after each change is committed. */
export function keptRoutes<Row extends KeptRow, Input extends { name: string }, Answer extends object>(
  register: Register,
  services: Services,
  endpoints: ReturnType<typeof keptEndpoints<Body, z.ZodObject>>,
  keeping: Keeping<Row, Input, Answer>,
  changed: Reassess,
): void {
  const { sequelize, clock } = services;
  const { table, present } = keeping;
  const what = endpoints.read.id.replace(/^read/, '').replace(/(?<!^)[A-Z]/g, ' $&').toLowerCase();
  const find = async (farmId: string, id: string, transaction: Transaction | null, lock = false) => {
    const row = await table.findOne({ where: { id, farmId } as never, transaction, ...(lock && transaction ? { lock: transaction.LOCK.UPDATE } : {}) });
    if (!row) throw notFound();
    return row;
  };
  const presentOne = async (row: Row, transaction: Transaction | null = null): Promise<Answer> => (await present([row], transaction))[0]!;
  const refuse = async (input: Input, farmId: string, transaction: Transaction): Promise<void> => {
    const problems = (await keeping.check?.(input, farmId, transaction)) ?? [];
    if (problems.length > 0) throw invalid(problems);
  };

  register(endpoints.list, async ({ params: { farmId }, query: { archived } }) => {
    const rows = await table.findAll({ where: { farmId, ...archivedWhere[archived] } as never, order: [['name', 'ASC'], ['id', 'ASC']] });
    return { items: await present(rows.map((row) => snapshot<Row>(row)), null) } as never;
  });

  register(endpoints.read, async ({ params: { farmId, id } }) => presentOne(snapshot<Row>(await find(farmId, id, null))) as never);

  register(endpoints.create, async ({ params: { farmId }, body, caller }) => {
    const input = body as unknown as Input;
    const { userId } = signedIn(caller);
    const answer = await inTransaction(sequelize, async (transaction) => {
      await refuse(input, farmId, transaction);
      const now = clock.now();
      const row = { ...keeping.defaults, ...keeping.columns(input), id: randomUUID(), farmId, version: 1, archivedAt: null, createdAt: now, updatedAt: now, updatedBy: userId } as unknown as Row;
      await table.create(row as never, { transaction });
      await keeping.afterWrite?.(row.id, input, transaction);
      if (keeping.audited) await audit(services, transaction, { farmId, userId, what: `${what} added`, subject: input.name });
      return presentOne(row, transaction);
    });
    await changed(farmId);
    return answer as never;
  });

  register(endpoints.update, async ({ params: { farmId, id }, body, caller }) => {
    const { version, ...rest } = body as { version?: number };
    const input = rest as unknown as Input;
    const { userId } = signedIn(caller);
    const answer = await inTransaction(sequelize, async (transaction) => {
      const row = await find(farmId, id, transaction, true);
      const before = snapshot<Row>(row);
      if (version !== undefined && version !== before.version) throw await changedMeanwhile(services, before, await presentOne(before, transaction), input, transaction);
      await refuse(input, farmId, transaction);
      const after = { ...before, ...keeping.columns(input), version: before.version + 1, updatedAt: clock.now(), updatedBy: userId };
      await row.update(after as never, { transaction });
      await keeping.afterWrite?.(id, input, transaction);
      const changes = differences(before, after, keeping.audited ?? []);
      if (Object.keys(changes).length > 0) await audit(services, transaction, { farmId, userId, what: `${what} changed`, subject: after.name, details: changes });
      return presentOne(after, transaction);
    });
    await changed(farmId);
    return answer as never;
  });

  register(endpoints.archive, async ({ params: { farmId, id }, body, caller }) => {
    const { userId } = signedIn(caller);
    const answer = await inTransaction(sequelize, async (transaction) => {
      const row = await find(farmId, id, transaction, true);
      const before = snapshot<Row>(row);
      // Said twice, it is done once.
      if (body.archived === (before.archivedAt !== null)) return presentOne(before, transaction);
      const now = clock.now();
      const after = { ...before, archivedAt: body.archived ? now : null, version: before.version + 1, updatedAt: now, updatedBy: userId };
      await row.update(after as never, { transaction });
      if (keeping.audited) await audit(services, transaction, { farmId, userId, what: `${what} ${body.archived ? 'archived' : 'brought back'}`, subject: after.name });
      return presentOne(after, transaction);
    });
    await changed(farmId);
    return answer as never;
  });
}
