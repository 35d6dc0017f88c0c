import { parentPort } from 'node:worker_threads'
import { answerReader, type ReaderQuestion, transferredWith } from './answer-reader'

/** The thread in which files are read: it answers each message by one. What fails here ends the thread, and the pool hears of it. */
parentPort!.on('message', async (question: ReaderQuestion) => {
  const answer = await answerReader(question)
  parentPort!.postMessage(answer, transferredWith(answer))
})
