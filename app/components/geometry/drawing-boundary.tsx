import { Component, type ReactNode } from 'react'
import { geometryWords as words } from '~/words/geometry'

interface Props {
  children: ReactNode
  className?: string
}

/** Keeps a drawing whose geometry did not come from taking the page with it: the rest stands, and it can be tried again. */
export class DrawingBoundary extends Component<Props, { failed: boolean }> {
  override state = { failed: false }

  static getDerivedStateFromError() {
    return { failed: true }
  }

  override render() {
    if (!this.state.failed) return this.props.children
    return (
      <div className={`${this.props.className ?? ''} drawing-failed`}>
        <p>{words.failed}</p>
        <button type="button" className="btn" onClick={() => this.setState({ failed: false })}>
          {words.again}
        </button>
      </div>
    )
  }
}
