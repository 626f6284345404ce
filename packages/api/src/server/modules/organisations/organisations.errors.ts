import { defineError } from '../../errors'

export const lastAdmin = defineError(
  'last-admin',
  409,
  'Somebody must stay who can manage this organisation: one admin without a last day. Make somebody else an admin first.',
)
