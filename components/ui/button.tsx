'use client';

import Link from 'next/link';
import type { ComponentProps } from 'react';
import { classNames } from './class-names';

type Variant = 'primary' | 'quiet' | 'danger';
type Size = 'normal' | 'big';

const VARIANTS: Record<Variant, string> = {
  primary: 'border-carbon bg-carbon text-carbon-on hover:border-ink hover:bg-ink hover:text-paper',
  quiet: 'border-wet bg-sheet text-carbon hover:border-carbon hover:bg-band',
  danger: 'border-keel bg-sheet text-keel hover:bg-keel hover:text-paper',
};
const SIZES: Record<Size, string> = {
  normal: 'min-h-11 px-4 py-1.5 text-[15px] md:min-h-9 md:px-3.5',
  big: 'min-h-16 w-full px-5 py-3 text-xl',
};

function looks(variant: Variant, size: Size, className?: string): string {
  return classNames(
    'inline-flex items-center justify-center gap-2 rounded-[3px] border font-semibold leading-tight',
    'no-underline select-none aria-disabled:cursor-default',
    VARIANTS[variant],
    SIZES[size],
    className,
  );
}

interface ButtonProps extends ComponentProps<'button'> {
  variant?: Variant;
  size?: Size;
  /** Something is under way: shown, and further presses do nothing. Focus stays where it is. */
  pending?: boolean;
}

export function Button(props: ButtonProps) {
  const {
    variant = 'primary',
    size = 'normal',
    pending = false,
    disabled = false,
    className,
    onClick,
    type = 'button',
    children,
    ...rest
  } = props;
  const still = pending || disabled;
  return (
    <button
      {...rest}
      type={type}
      aria-disabled={still || undefined}
      aria-busy={pending || undefined}
      className={classNames(
        looks(variant, size, className),
        'relative overflow-hidden',
        disabled && !pending && 'opacity-60',
      )}
      onClick={(event) => {
        if (still) event.preventDefault();
        else onClick?.(event);
      }}
    >
      {children}
      {pending && <span aria-hidden className="busy-rule absolute inset-x-0 bottom-0 h-1" />}
    </button>
  );
}

interface LinkButtonProps extends ComponentProps<typeof Link> {
  variant?: Variant;
  size?: Size;
}

/** A link that looks like a button: for going somewhere, not for changing something. */
export function LinkButton({
  variant = 'quiet',
  size = 'normal',
  className,
  ...rest
}: LinkButtonProps) {
  return <Link {...rest} className={looks(variant, size, className)} />;
}
