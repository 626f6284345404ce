import { defineError } from '../../errors'

export const stillServes = defineError('gauge-in-use', 409, (tasks: number) =>
  tasks === 1
    ? 'This gauge serves an active measuring task. Archive the task first.'
    : `This gauge serves ${tasks} active measuring tasks. Archive them first.`,
)

export const hasCertificate = defineError(
  'has-certificate',
  409,
  'This calibration has its certificate already. Certificates are never replaced; enter the calibration anew if it was the wrong one.',
)
