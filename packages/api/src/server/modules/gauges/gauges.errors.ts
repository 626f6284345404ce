import { defineError } from '../../errors'

export const stillServes = defineError('gauge-in-use', 409, (tasks: number) =>
  tasks === 1
    ? 'This gauge serves an active measuring task. Archive the task first.'
    : `This gauge serves ${tasks} active measuring tasks. Archive them first.`,
)
