import { ping } from '~/db/ping.server'

/** 200 while the process reaches its database, else 503. */
export async function loader() {
  const ok = await ping()
  return Response.json({ ok }, { status: ok ? 200 : 503 })
}
