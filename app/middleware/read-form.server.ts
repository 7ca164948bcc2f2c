import { refusal } from '~/middleware/refusal.server'

/**
 * The fields of a sent form.
 *
 * @throws a refusal where the body is no form, or a broken one
 */
export async function readForm(request: Request): Promise<FormData> {
  try {
    return await request.formData()
  } catch (error) {
    if (error instanceof TypeError) throw refusal('broken-form')
    throw error
  }
}
