import { formFields } from './form-fields'
import { refusal } from './refusal.server'

/**
 * The fields of a sent form, as `formFields` lets them through.
 *
 * @throws a refusal where the body is no form, a broken one or one that no page of ours sends
 */
export async function readForm(request: Request): Promise<FormData> {
  const fields = formFields(await sentForm(request))
  if (!fields) throw refusal('broken-form')
  return fields
}

async function sentForm(request: Request): Promise<FormData> {
  try {
    return await request.formData()
  } catch (error) {
    if (error instanceof TypeError) throw refusal('broken-form')
    throw error
  }
}
