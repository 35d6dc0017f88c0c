'use client'

import clsx from 'clsx'
import { useState } from 'react'
import { useDropzone } from 'react-dropzone'
import { Button } from '@/components/ui/button'

interface DropAreaProps {
  readonly onFile: (file: File) => void
  /** Name of the file that is already here, when another may take its place. */
  readonly present: string | null
}

/** Takes one file, dropped or chosen. Any file is taken: what is not a URDF gets its finding. */
export function DropArea({ onFile, present }: DropAreaProps) {
  const [remark, setRemark] = useState('')
  const { getRootProps, getInputProps, isDragActive, open } = useDropzone({
    multiple: false,
    noClick: true,
    noKeyboard: true,
    onDrop: (accepted, refused) => {
      const file = accepted[0]
      setRemark(file === undefined && refused.length > 0 ? `Drop one file at a time; these were ${refused.length}.` : '')
      if (file !== undefined) onFile(file)
    },
  })
  const isEmpty = present === null
  return (
    <div {...getRootProps()} className={clsx('border border-dashed bg-sheet px-5', isEmpty ? 'py-12' : 'py-3', isDragActive ? 'border-blue bg-wash' : 'border-soft')}>
      <input {...getInputProps()} aria-label="URDF file or archive" tabIndex={-1} />
      <div className={clsx('flex flex-wrap items-center gap-x-6 gap-y-3', isEmpty ? 'flex-col text-center' : 'justify-between')}>
        <p className="min-w-0">
          <span className="block text-15 font-semibold break-all">
            {isDragActive ? 'Let go to check this file' : isEmpty ? 'Drop a .urdf or .zip file here' : <bdi>{present}</bdi>}
          </span>
          <span className="text-soft">
            {isEmpty ? 'It is checked at once and stored only when you say so. A .urdf up to 8 MiB; with its meshes as a .zip up to 64 MiB.' : 'Drop another file to check it in place of this one.'}
          </span>
        </p>
        <Button onClick={open} variant={isEmpty ? 'primary' : 'plain'}>
          {isEmpty ? 'Choose a file' : 'Choose another'}
        </Button>
      </div>
      <p role="status" className="font-medium text-verm">
        {remark}
      </p>
    </div>
  )
}
