import clsx from 'clsx'
import { CopyButton } from './copy-button'

/** The first 16 digits in four groups, as they are read out over a telephone. */
export const groupFingerprint = (fingerprint: string): string => (fingerprint.slice(0, 16).match(/.{1,4}/g) ?? []).join(' ')

interface FingerprintProps {
  /** 64 hexadecimal digits. */
  readonly value: string
  /** Offers to copy all 64 digits; default true. */
  readonly copy?: boolean
  readonly className?: string
}

/** A fingerprint: 16 digits shown, all 64 on hover and when copied. */
export function Fingerprint({ value, copy = true, className }: FingerprintProps) {
  return (
    <span className={clsx('inline-flex items-baseline gap-1.5', className)}>
      <span className="num whitespace-nowrap" title={value}>
        {groupFingerprint(value)}
      </span>
      {copy ? <CopyButton text={value} what="fingerprint" /> : null}
    </span>
  )
}
