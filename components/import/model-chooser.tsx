'use client'

import { useQuery } from '@tanstack/react-query'
import { useDeferredValue, useId, useState } from 'react'
import type { ComponentProps } from 'react'
import { call } from '@/components/api/call'
import { TextField } from '@/components/ui/text-field'

interface ModelChooserProps extends ComponentProps<'input'> {
  readonly team: string
  readonly error?: string | undefined
}

/** Names a model of the team; the browser's own list offers those that match what is typed. */
export function ModelChooser({ team, error, onChange, ...rest }: ModelChooserProps) {
  const [typed, setTyped] = useState('')
  const query = useDeferredValue(typed)
  const list = useId()
  const { data } = useQuery({
    queryKey: ['models to choose from', team, query],
    queryFn: ({ signal }) => call('listModels', { path: { team }, query: { query: query || undefined, limit: 20 }, signal }),
    placeholderData: (known) => known,
  })
  return (
    <>
      <TextField
        {...rest}
        label="Model"
        hint="Its name in addresses, such as skerry-7."
        error={error}
        list={list}
        autoComplete="off"
        spellCheck={false}
        onChange={(event) => {
          setTyped(event.target.value)
          return onChange?.(event)
        }}
      />
      <datalist id={list}>
        {data?.body.items.map((model) => (
          <option key={model.slug} value={model.slug}>
            {model.name}
          </option>
        ))}
      </datalist>
    </>
  )
}
