'use client';
import { Button as AriaButton } from 'react-aria-components/Button';
import type { ButtonProps } from 'react-aria-components/Button';
import styles from './ui.module.css';

/** A button: a word with a hairline under it, or (`strong`) the one thing to do next. */
export function Button({ strong = false, className, ...props }: Omit<ButtonProps, 'className'> & { strong?: boolean; className?: string }) {
  return <AriaButton {...props} className={[styles.button, strong ? styles.strong : '', className ?? ''].join(' ')} />;
}
