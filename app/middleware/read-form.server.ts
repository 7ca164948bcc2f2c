import { formFields, MOST_FIELDS } from './form-fields'
import { refusal } from './refusal.server'

/**
 * The fields of a sent form, as `formFields` lets them through.
 *
 * @throws a refusal where the body is no form, a broken one or one that no page of ours sends
 */
export async function readForm(request: Request): Promise<FormData> {
  const sent = await sentFields(request)
  const fields = sent && formFields(sent)
  if (!fields) throw refusal('broken-form')
  return fields
}

/** Fields of an address's letters are counted before they are taken apart: a megabyte of `&` would take seconds. */
async function sentFields(request: Request): Promise<FormData | URLSearchParams | null> {
  try {
    const type = request.headers.get('Content-Type') ?? ''
    if (!/^application\/x-www-form-urlencoded\b/i.test(type)) return await request.formData()
    const text = await request.text()
    return text.split('&', MOST_FIELDS + 1).length > MOST_FIELDS ? null : new URLSearchParams(text)
  } catch (error) {
    if (error instanceof TypeError) return null
    throw error
  }
}
