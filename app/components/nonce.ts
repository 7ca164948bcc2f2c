import { createContext, useContext } from 'react'

/** Nonce of the document's Content-Security-Policy; empty in the browser, which hides it from scripts. */
export const NonceContext = createContext('')

export const useNonce = () => useContext(NonceContext)
