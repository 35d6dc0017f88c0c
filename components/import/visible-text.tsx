import { Fragment } from 'react'

/** Control, direction and invisible characters: everything that a reader of the source would not see or be misled by.
 *  A tab is ordinary indentation and stays. */
const HIDDEN = /[\0-\x08\x0b-\x1f\x7f-\x9f\xad\u061c\u200b-\u200f\u2028-\u202e\u2060-\u206f\ufeff\ufff9-\ufffd]/

const nameOf = (character: string): string => `U+${character.charCodeAt(0).toString(16).toUpperCase().padStart(4, '0')}`

/** A piece of source with every hidden character written as its code in a box. */
export function VisibleText({ text }: { readonly text: string }) {
  if (!HIDDEN.test(text)) return <>{text}</>
  return (
    <>
      {text.split(new RegExp(`(${HIDDEN.source})`)).map((part, i) =>
        i % 2 === 1 ? (
          <span key={i} className="mx-px border border-amber px-0.5 text-12 text-amber" title="A character that is not visible by itself">
            {nameOf(part)}
          </span>
        ) : (
          <Fragment key={i}>{part}</Fragment>
        ),
      )}
    </>
  )
}
