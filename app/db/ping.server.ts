import { pool } from './client.server'

/** Whether the database answers. */
export async function ping(): Promise<boolean> {
  try {
    await pool.query('select 1')
    return true
  } catch {
    return false
  }
}
