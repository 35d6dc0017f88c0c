import { OpenAPIRegistry, OpenApiGeneratorV31 } from '@asteasolutions/zod-to-openapi'
import { OPERATIONS } from '@/lib/contract/operations'
import { describeOperation } from './describe-operation'

const DESCRIPTION = `Kinematics answered from exactly the released description.

Twists are linear first, quaternions are [x, y, z, w], matrices are row by row, and everything is SI unless "units" says otherwise: see /docs/conventions.

Results are engineering aids computed from the model as imported. They are not a safety function, and the service must not be part of one. Check every motion at reduced speed with the enabling device in hand; the machine's risk assessment, local codes and qualified, licensed people decide. A missing or late answer means hold.`

/** The OpenAPI 3.1 document of the contract, built from its declarations. */
export function buildDocument() {
  const registry = new OpenAPIRegistry()
  registry.registerComponent('securitySchemes', 'key', { type: 'http', scheme: 'bearer', description: 'A key of the team: elb_…' })
  registry.registerComponent('securitySchemes', 'session', {
    type: 'apiKey',
    in: 'cookie',
    name: 'next-auth.session-token',
    description: 'The session of the web pages. A state-changing request also needs an Origin equal to this installation.',
  })
  for (const [name, operation] of Object.entries(OPERATIONS)) registry.registerPath(describeOperation(name as keyof typeof OPERATIONS, operation))
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: { title: 'Elbowroom', version: '1', description: DESCRIPTION },
    servers: [{ url: '/api/v1' }],
    tags: [
      { name: 'Catalog', description: 'Models, their revisions, and what the importer found.' },
      { name: 'Kinematics', description: 'Answers computed from one revision, named in every reply.' },
      { name: 'Evidence', description: 'What two revisions differ in at the tip, numbers for the controller to meet, and measured poses held against the model.' },
      { name: 'Keys', description: 'Keys for scripts and gateways. By session only.' },
    ],
  })
}
