import { studies, type gauges, type tasks } from '@evenrule/api/contract'
import { computed, ref } from 'vue'
import { useForm } from '../../forms/useForm'
import { parseNumber } from '../../format'
import { useApi } from '../../session/client'
import { planWords as words } from '../../strings/studies'
import { useHere } from '../common'
import { chanceOf, planAnswer, slotsOf } from './planFacts'
import { usePlan } from './usePlan'

/** What a study is planned for. */
export interface StudyStart {
  task: tasks.MeasuringTask
  gauge: gauges.Gauge
  code: string
}

/** The form of a new study, the plan for what is assumed in it, and the number of readings that follows. */
export function useNewStudy(start: StudyStart, done: (study: studies.Study) => void) {
  const api = useApi()
  const here = useHere()
  const form = useForm({
    initial: {
      otherTaskIds: [] as string[],
      standardId: '',
      unit: start.gauge.unit,
      measuredAs: 'value' as 'value' | 'deviation',
      bias: '0',
      standardDeviation: start.gauge.resolution,
      chance: '90',
      /** Empty while the plan's own number stands. */
      plannedReadings: '',
      code: start.code,
      slots: '',
      history: false,
    },
    storageKey: `study.${start.task.id}`,
    validate: (values) => ({
      standardId: values.standardId ? undefined : words.chooseStandard,
      bias: parseNumber(values.bias).value === null ? words.number : undefined,
      standardDeviation: (parseNumber(values.standardDeviation).value ?? 0) > 0 ? undefined : words.above,
      chance: chanceOf(values.chance) === undefined ? words.chanceBounds : undefined,
      plannedReadings: /^\d+$/.test(plannedText().trim()) ? undefined : words.whole,
      code: values.code.trim() ? undefined : words.codeMissing,
    }),
    submit: ({ otherTaskIds, slots, history, bias, standardDeviation, chance, ...rest }) =>
      api.call(studies.registerStudy, {
        params: here.params(),
        body: {
          ...rest,
          taskIds: [start.task.id, ...otherTaskIds],
          plannedReadings: Number(plannedText()),
          slots: slotsOf(slots),
          registeredBeforehand: !history,
          plan: { bias, standardDeviation, chance: chanceOf(chance) ?? 0 },
        },
      }),
    done,
  })
  const plan = usePlan(() => ({
    taskIds: [start.task.id, ...form.values.otherTaskIds],
    unit: form.values.unit,
    bias: form.values.bias,
    standardDeviation: form.values.standardDeviation,
    chance: form.values.chance,
  }))
  const least = computed(() => plan.data.value?.readings ?? null)

  // The plan's number is nothing typed that could be lost, so it stays out of the form until somebody types another.
  const typed = ref(form.values.plannedReadings !== '')
  function plannedText(): string {
    return typed.value ? form.values.plannedReadings : String(least.value ?? '')
  }
  /** Binding of the field with the planned number. */
  function plannedField() {
    const field = form.field<string>('plannedReadings')
    return {
      ...field,
      modelValue: plannedText(),
      'onUpdate:modelValue'(text: string) {
        typed.value = true
        field['onUpdate:modelValue'](text)
      },
    }
  }
  const plannedHint = computed(() => {
    if (least.value === null) return undefined
    const wanted = Number(plannedText())
    const fewer = wanted > 0 && wanted < least.value
    return fewer ? words.plannedBelow(least.value) : words.plannedHint(least.value)
  })
  const answer = computed(() =>
    plan.data.value ? planAnswer(plan.data.value, chanceOf(form.values.chance) ?? 0) : undefined,
  )
  return { form, plan, answer, plannedField, plannedHint }
}
