import { db } from './connection';
export type Transaction = Parameters<Parameters<typeof db.transaction>[0]>[0];
export const transaction = <T>(work: (tx: Transaction) => Promise<T>): Promise<T> => db.transaction(work);
