import { useCallback, useState } from 'react'

/**
 * The width in px that a drawing has, so that its letters keep their size on every screen. Until the browser has laid out the
 * page it is the server's guess.
 * @returns a ref for the element around the drawing, and the width
 */
export function useSheetWidth(guess: number): readonly [ref: (element: HTMLElement | null) => void, width: number] {
  const [width, setWidth] = useState(guess)
  const ref = useCallback((element: HTMLElement | null) => {
    if (!element) return
    const observer = new ResizeObserver(([entry]) => {
      const measured = Math.round(entry?.contentRect.width ?? 0)
      if (measured > 0) setWidth(measured)
    })
    observer.observe(element)
    return () => observer.disconnect()
  }, [])
  return [ref, width]
}
