import type { UseCase, WritingUseCase } from '@/lib/access/use-case'
import { type OperationName, OPERATIONS } from '@/lib/contract/operations'
import { endpoint } from './endpoint'
import { methods } from './methods'

type UseCases = { readonly [N in OperationName]?: UseCase<N> | WritingUseCase<N> }

/** The handlers of one path of the contract, from the use-cases behind its operations. */
export function resource(useCases: UseCases) {
  const names = Object.keys(useCases) as OperationName[]
  return methods(Object.fromEntries(names.map((name) => [OPERATIONS[name].method, endpoint(name, useCases[name] as UseCase<OperationName>)])))
}
