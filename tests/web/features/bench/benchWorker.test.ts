import { describe, expect, it } from 'vitest'
import type { BenchAnswer, BenchRequest } from '#core/bench/types'
import { benchClient } from '../../../../web/src/features/bench/benchWorker.ts'
import type { BenchOutcome, WorkerPort } from '../../../../web/src/features/bench/benchWorker.ts'
import type { BenchQuestion } from '../../../../web/src/workers/bench.worker.ts'

/** A worker that answers when told to. */
function standIn() {
  const asked: BenchQuestion[] = []
  let ended = false
  const port: WorkerPort = {
    onmessage: null,
    onerror: null,
    postMessage: (question) => void asked.push(question),
    terminate: () => void (ended = true),
  }
  const answer = (id: number): void => {
    const reply: BenchAnswer = { status: 'failed', reason: `answer ${id}` }
    port.onmessage?.(new MessageEvent('message', { data: { id, answer: reply } }))
  }
  return {
    port,
    asked,
    answer,
    fail: (message: string) => port.onerror?.({ message } as ErrorEvent),
    ended: () => ended,
  }
}

const request = (mass: number): BenchRequest => ({ candidate: { massGeV: mass } }) as unknown as BenchRequest
const massOf = ({ request: asked }: BenchQuestion): number => asked.candidate.massGeV

describe('the Bench’s worker', () => {
  it('is asked one question at a time; of those that wait only the newest is asked', () => {
    const { port, asked, answer } = standIn()
    const heard: number[] = []
    const client = benchClient(
      () => port,
      (_answer, of) => heard.push(of.candidate.massGeV),
    )
    for (const mass of [1, 2, 3, 4]) client.ask(request(mass))
    expect(asked.map(massOf)).toEqual([1])
    answer(asked[0]!.id)
    expect(asked.map(massOf)).toEqual([1, 4])
    expect(heard).toEqual([])
    answer(asked[1]!.id)
    expect(heard).toEqual([4])
  })

  it('does not take an answer to an old question for the answer to the new one', () => {
    const { port, asked, answer } = standIn()
    const heard: string[] = []
    const client = benchClient(
      () => port,
      (given) => heard.push(given.status),
    )
    client.ask(request(1))
    answer(asked[0]!.id + 17)
    expect(heard).toEqual([])
    answer(asked[0]!.id)
    expect(heard).toEqual(['failed'])
  })

  it('says so when the worker breaks down, and starts another for the next question', () => {
    const [first, second] = [standIn(), standIn()]
    const workers = [first, second]
    const heard: [BenchOutcome, number][] = []
    const client = benchClient(
      () => workers.shift()!.port,
      (given, of) => heard.push([given, of.candidate.massGeV]),
    )
    client.ask(request(1))
    first.fail('out of memory')
    expect(heard).toEqual([[{ status: 'broken', reason: 'out of memory' }, 1]])
    expect(first.ended()).toBe(true)
    client.ask(request(2))
    second.answer(second.asked[0]!.id)
    expect(heard[1]).toEqual([{ status: 'failed', reason: `answer ${second.asked[0]!.id}` }, 2])
  })

  it('leaves no question without an outcome when the worker cannot be loaded', () => {
    const { port, fail } = standIn()
    const heard: [BenchOutcome, number][] = []
    const client = benchClient(
      () => port,
      (given, of) => heard.push([given, of.candidate.massGeV]),
    )
    client.ask(request(1))
    client.ask(request(2))
    fail('')
    expect(heard).toEqual([[{ status: 'broken', reason: expect.stringContaining('could not be loaded') }, 2]])
  })

  it('ends with the page', () => {
    const { port, ended } = standIn()
    const client = benchClient(
      () => port,
      () => undefined,
    )
    client.ask(request(1))
    client.close()
    expect(ended()).toBe(true)
  })
})
