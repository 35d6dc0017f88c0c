import type { Metadata } from 'next'
import { Neighbours } from '@/components/docs/docs-page'
import { Reference } from '@/components/docs/reference'
import { Caution } from '@/components/shell/caution'
import { TextLink } from '@/components/ui/text-link'

export const metadata: Metadata = { title: 'API reference' }

export default function ReferencePage() {
  // The main landmark of this page is the widget's own, so its head stands in a section.
  return (
    <div className="w-full min-w-0 px-4 pt-5 pb-10 desk:px-6">
      <section id="main" tabIndex={-1} aria-label="About the reference" className="outline-none">
        <h1>API reference</h1>
        <p className="mt-1 max-w-[44rem] text-15 text-soft">
          Generated from the same declarations that the service checks each request with. <b className="font-semibold text-ink">Try it out</b> sends real
          requests: signed in, you act as yourself; with <b className="font-semibold text-ink">Authorize</b>, as the key that you type in. Questions and answers in
          binary records and CSV are described under{' '}
          <TextLink inline href="/docs/formats">
            formats
          </TextLink>
          .
        </p>
        <Caution className="mt-2 max-w-[44rem]" />
        <h2 className="mt-6 text-18">Operations</h2>
      </section>
      <Reference />
      <Neighbours href="/docs/reference" />
    </div>
  )
}
