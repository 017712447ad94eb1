import { Button } from '@blueprintjs/core';
import { Component, type ErrorInfo, type ReactNode } from 'react';
import styles from './page-states.module.css';

/** Four signs that name a fault: the same fault gives the same code, so that people can tell it over the radio. */
export function faultCode(problem: unknown): string {
  const text = problem instanceof Error ? `${problem.name}: ${problem.message}` : String(problem);
  let sum = 0x811c;
  for (const sign of text) sum = ((sum ^ (sign.codePointAt(0) ?? 0)) * 0x0193) & 0xffff;
  return sum.toString(16).toUpperCase().padStart(4, '0');
}

interface Props {
  /** What broke, as the sentence names it: "This panel", "This list". */
  part?: string;
  /** What goes on: "The board is fine." */
  rest?: string;
  children: ReactNode;
}

/** Keeps a fault inside one part of the page, says so, and can draw the part anew. */
export class PartBoundary extends Component<Props, { problem: unknown }> {
  override state = { problem: undefined as unknown };

  static getDerivedStateFromError(problem: unknown): { problem: unknown } {
    return { problem: problem ?? new Error('unknown') };
  }

  override componentDidCatch(problem: Error, info: ErrorInfo): void {
    console.error(`Fault ${faultCode(problem)}`, problem, info.componentStack);
  }

  override render(): ReactNode {
    if (this.state.problem === undefined) return this.props.children;
    const { part = 'This panel', rest = 'The board is fine.' } = this.props;
    const name = part.replace(/^This /, '');
    return (
      <div className={styles.state} role="alert">
        <p>
          {part} stopped working. {rest}
        </p>
        <div className="sp-actions">
          <Button onClick={() => this.setState({ problem: undefined })}>Reload {name}</Button>
          <span className="muted">code {faultCode(this.state.problem)}</span>
        </div>
      </div>
    );
  }
}
