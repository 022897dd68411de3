import { LoaderCircle } from 'lucide-react';
import type { ComponentProps, JSX, ReactNode } from 'react';
import { Link } from 'react-router-dom';

import { classNames } from '#client/lib/class-names.ts';

export type ButtonVariant = 'primary' | 'plain' | 'quiet' | 'danger';

const base =
  'inline-flex items-center justify-center gap-2 rounded-control font-medium whitespace-nowrap ' +
  'transition-colors duration-100 disabled:opacity-55 aria-disabled:opacity-55 select-none';

const variants: Record<ButtonVariant, string> = {
  primary: 'border border-ink bg-ink text-paper hover:bg-ink/85 disabled:hover:bg-ink',
  plain: 'border border-line bg-raised text-ink hover:border-faint disabled:hover:border-line',
  quiet: 'border border-transparent text-ink hover:bg-wash',
  danger: 'border border-fails bg-raised text-fails hover:bg-fails hover:text-raised',
};

const sizes = { small: 'h-8 px-3 text-small', normal: 'h-9 px-3.5', large: 'h-11 px-5' } as const;

function look(variant: ButtonVariant, size: keyof typeof sizes, className?: string): string {
  return classNames(base, variants[variant], sizes[size], className);
}

interface ButtonLook {
  variant?: ButtonVariant;
  size?: keyof typeof sizes;
}

interface ButtonProps extends ComponentProps<'button'>, ButtonLook {
  /** Work is under way: shows a turning mark and takes no second click. */
  isBusy?: boolean;
}

/** A button; `primary` once per view at most. */
export function Button({
  variant = 'plain',
  size = 'normal',
  isBusy = false,
  className,
  children,
  disabled,
  ...rest
}: ButtonProps): JSX.Element {
  return (
    <button
      type="button"
      {...rest}
      disabled={disabled === true || isBusy}
      aria-busy={isBusy || undefined}
      className={look(variant, size, className)}
    >
      {isBusy && <LoaderCircle aria-hidden className="size-4 animate-spin" />}
      {children}
    </button>
  );
}

type ButtonLinkProps = ComponentProps<typeof Link> & ButtonLook;

/** A link that looks like a button: it leads somewhere. */
export function ButtonLink({
  variant = 'plain',
  size = 'normal',
  className,
  ...rest
}: ButtonLinkProps): JSX.Element {
  return <Link {...rest} className={look(variant, size, className)} />;
}

interface IconButtonProps extends Omit<ComponentProps<'button'>, 'children'> {
  /** Read aloud and shown on hover. */
  label: string;
  icon: ReactNode;
}

/** A square button with a sign only; the label is its name. */
export function IconButton({ label, icon, className, ...rest }: IconButtonProps): JSX.Element {
  return (
    <button
      type="button"
      title={label}
      {...rest}
      aria-label={label}
      className={classNames(
        'inline-grid size-8 shrink-0 place-items-center rounded-control text-soft',
        'transition-colors duration-100 hover:bg-wash hover:text-ink disabled:opacity-55',
        className,
      )}
    >
      {icon}
    </button>
  );
}
