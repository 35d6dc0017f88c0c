import { parentPort } from 'node:worker_threads'
import { answerReader, type ReaderQuestion } from './answer-reader'

/** The thread in which files are read: it answers each message by one. */
parentPort!.on('message', (question: ReaderQuestion) => parentPort!.postMessage(answerReader(question)))
