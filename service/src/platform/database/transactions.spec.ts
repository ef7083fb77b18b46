import { DataSource } from 'typeorm';
import { Transactions } from './transactions.js';

describe('transactions', () => {
  let database: DataSource;
  let transactions: Transactions;

  beforeEach(async () => {
    database = await new DataSource({ type: 'better-sqlite3', database: ':memory:' }).initialize();
    await database.query('CREATE TABLE notes (text text)');
    transactions = new Transactions(database);
  });
  afterEach(() => database.destroy());

  const slowly = () => new Promise((resolve) => setTimeout(resolve, 20));

  it('keep what one caller wrote when another at the same time fails', async () => {
    const fails = transactions.run(async (manager) => {
      await manager.query("INSERT INTO notes VALUES ('lost')");
      await slowly();
      throw new Error('no');
    });
    const holds = transactions.run(async (manager) => {
      await manager.query("INSERT INTO notes VALUES ('kept')");
      await slowly();
    });
    await expect(fails).rejects.toThrow('no');
    await holds;
    expect(await database.query('SELECT text FROM notes')).toEqual([{ text: 'kept' }]);
  });
});
