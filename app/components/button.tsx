import type { ButtonHTMLAttributes, ReactNode } from 'react'
import { Link } from 'react-router'

export type ButtonVariant = 'primary' | 'plain' | 'danger'
/** Heights in px: 44 at a desk, 48 at the bedside, 56 for the final act. */
export type ButtonSize = 44 | 48 | 56

interface Look {
  readonly variant?: ButtonVariant
  readonly size?: ButtonSize
  readonly className?: string
  readonly children: ReactNode
}
export interface ButtonProps extends Look, Omit<ButtonHTMLAttributes<HTMLButtonElement>, 'className' | 'children'> {}
export interface LinkButtonProps extends Look {
  readonly href: string
  /** Leaves the application's own navigation: files, prints, other hosts. */
  readonly reload?: boolean
  /** Read instead of the words on it, which it must begin with. */
  readonly label?: string
  /** It leads to what is shown. */
  readonly current?: boolean
}

const BASE =
  'inline-flex items-center justify-center gap-2 rounded-control border text-center leading-tight font-semibold no-underline select-none disabled:cursor-not-allowed disabled:opacity-60 print:hidden'
const variants: Readonly<Record<ButtonVariant, string>> = {
  primary: 'border-brand bg-brand text-brand-ink hover:brightness-110',
  plain: 'border-edge bg-surface text-ink hover:bg-sunk',
  danger: 'border-late bg-surface text-late hover:bg-late-tint',
}
const sizes: Readonly<Record<ButtonSize, string>> = {
  44: 'min-h-11 px-4 py-1.5 text-base',
  48: 'min-h-12 px-4 py-2 text-base',
  56: 'min-h-14 px-6 py-2 text-lg',
}

const look = (variant: ButtonVariant = 'plain', size: ButtonSize = 44, className = ''): string =>
  `${BASE} ${variants[variant]} ${sizes[size]} ${className}`

export function Button({ variant, size, className, type = 'submit', children, ...rest }: ButtonProps) {
  return (
    <button type={type} className={look(variant, size, className)} {...rest}>
      {children}
    </button>
  )
}

/** A link that looks like a button: it goes somewhere, and changes nothing. */
export function LinkButton({
  variant,
  size,
  className,
  href,
  reload = false,
  label,
  current,
  children,
}: LinkButtonProps) {
  return (
    <Link
      to={href}
      reloadDocument={reload}
      aria-label={label}
      aria-current={current ? 'page' : undefined}
      className={look(variant, size, className)}
    >
      {children}
    </Link>
  )
}
