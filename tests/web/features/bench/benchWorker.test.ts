import { describe, expect, it } from 'vitest'
import type { BenchAnswer, BenchRequest } from '#core/bench/types'
import { benchClient } from '../../../../web/src/features/bench/benchWorker.ts'
import type { WorkerPort } from '../../../../web/src/features/bench/benchWorker.ts'
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
    const client = benchClient(port, (_answer, of) => heard.push(of.candidate.massGeV))
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
    const client = benchClient(port, (given) => heard.push(given.status))
    client.ask(request(1))
    answer(asked[0]!.id + 17)
    expect(heard).toEqual([])
    answer(asked[0]!.id)
    expect(heard).toEqual(['failed'])
  })

  it('says so when the worker fails, and goes on', () => {
    const { port, asked, fail, answer } = standIn()
    const heard: BenchAnswer[] = []
    const client = benchClient(port, (given) => heard.push(given))
    client.ask(request(1))
    fail('out of memory')
    expect(heard).toEqual([{ status: 'failed', reason: 'out of memory' }])
    client.ask(request(2))
    answer(asked[1]!.id)
    expect(heard).toHaveLength(2)
  })

  it('ends with the page', () => {
    const { port, ended } = standIn()
    benchClient(port, () => undefined).close()
    expect(ended()).toBe(true)
  })
})
