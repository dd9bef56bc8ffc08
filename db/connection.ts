import { drizzle } from 'drizzle-orm/mysql2';
import mysql from 'mysql2/promise';

const pool = mysql.createPool({ uri: process.env.DATABASE_URL ?? '', timezone: 'Z', decimalNumbers: false });
export const db = drizzle(pool, { casing: 'snake_case' });
