'use client'

import clsx from 'clsx'
import { useState, type ReactNode } from 'react'
import { useDropzone } from 'react-dropzone'
import { Button } from '@/components/ui/button'

interface TableDropProps {
  readonly onText: (text: string) => void
  /** The field that takes pasted rows. */
  readonly children: ReactNode
}

const MOST_BYTES = 4_000_000

/** Reads a file as UTF-8, or answers why it cannot be taken. */
async function readText(file: File): Promise<{ text: string } | { refusal: string }> {
  if (file.size > MOST_BYTES) return { refusal: `${file.name} is larger than 4 MB: it is no table of reference poses.` }
  try {
    return { text: new TextDecoder('utf-8', { fatal: true }).decode(await file.arrayBuffer()) }
  } catch {
    return { refusal: `${file.name} is not text in UTF-8. Save it as CSV, UTF-8, and drop it again.` }
  }
}

/** Takes a dropped or chosen CSV file into the field inside it. */
export function TableDrop({ onText, children }: TableDropProps) {
  const [remark, setRemark] = useState('')
  const { getRootProps, getInputProps, isDragActive, open } = useDropzone({
    multiple: false,
    noClick: true,
    noKeyboard: true,
    onDrop: async ([file], refused) => {
      if (file === undefined) return setRemark(refused.length > 0 ? 'Drop one file at a time.' : '')
      const read = await readText(file)
      setRemark('refusal' in read ? read.refusal : '')
      if ('text' in read) onText(read.text)
    },
  })
  return (
    <div {...getRootProps()} className={clsx('border border-dashed px-4 py-3', isDragActive ? 'border-blue bg-wash' : 'border-soft bg-sheet')}>
      <input {...getInputProps()} aria-label="CSV file" tabIndex={-1} />
      {children}
      <div className="mt-2 flex flex-wrap items-center gap-3">
        <Button onClick={open}>Choose a CSV file</Button>
        <span className="label">or drop one here</span>
      </div>
      <p role="status" className="font-medium text-verm">
        {remark}
      </p>
    </div>
  )
}
