import Link from 'next/link';
import type { ComponentProps } from 'react';
import { classNames } from './class-names';

export type ButtonLook = 'solid' | 'outline' | 'quiet';
export interface ButtonStyle {
  /** Solid ink for the one thing to do here; outline beside it; quiet within a row. */
  look?: ButtonLook;
  size?: 'small' | 'normal';
}

const LOOKS: Record<ButtonLook, string> = {
  solid: 'bg-ink text-on-ink border-ink hover:bg-ink-hover hover:border-ink-hover active:translate-y-px',
  outline: 'bg-paper text-ink border-ink hover:bg-wash active:bg-pressed',
  quiet: 'bg-transparent text-ink border-transparent hover:bg-wash active:bg-pressed',
};
const SIZES = { small: 'min-h-8 px-2.5 text-data', normal: 'min-h-10 px-4 text-data' };

export function buttonClasses({ look = 'outline', size = 'normal' }: ButtonStyle = {}): string {
  return classNames(
    'inline-flex items-center justify-center gap-2 rounded-tile border font-[560] whitespace-nowrap select-none',
    'transition-[background-color,transform] duration-100 disabled:opacity-45 disabled:pointer-events-none',
    LOOKS[look],
    SIZES[size],
  );
}

/** A plain button, so that it works in a form before any script has come. */
export function Button({ look, size, className, type = 'button', ...rest }: ComponentProps<'button'> & ButtonStyle) {
  return <button type={type} className={classNames(buttonClasses({ look, size }), className)} {...rest} />;
}

export function ButtonLink({ look, size, className, ...rest }: ComponentProps<typeof Link> & ButtonStyle) {
  return <Link className={classNames(buttonClasses({ look, size }), className)} {...rest} />;
}
