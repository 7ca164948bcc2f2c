import { FormDataParseError, MaxFilesExceededError, parseFormData } from '@remix-run/form-data-parser'
import { formFields } from './form-fields'

/** Bytes a part may have: a little over what a form takes, so that the form itself can say of its file that it is too large. */
const PART_LIMIT = 21_500_000

/**
 * The fields, as `formFields` lets them through, and the one file of a multipart form, kept in memory; null where what came is
 * no such form or broke off on the way. The body's size is limited before.
 */
export async function readUpload(request: Request): Promise<FormData | null> {
  try {
    const limits = { maxFiles: 1, maxFileSize: PART_LIMIT, maxParts: 20, maxTotalSize: PART_LIMIT }
    return formFields(await parseFormData(request, limits))
  } catch (error) {
    if (error instanceof FormDataParseError || error instanceof MaxFilesExceededError || error instanceof TypeError) {
      return null
    }
    throw error
  }
}
