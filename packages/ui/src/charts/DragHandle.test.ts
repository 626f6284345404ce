import { mount } from '@vue/test-utils'
import { describe, expect, it } from 'vitest'
import DragHandle from './DragHandle.vue'
import { linearScale } from './scales'

const props = {
  label: 'Planned readings',
  value: 25,
  least: 5,
  most: 100,
  step: 1,
  text: '25 readings',
  scale: linearScale([5, 100], [40, 420]),
  top: 30,
  bottom: 190,
}

describe('the slide on an axis', () => {
  it('says what it sets, where it stands and between what', () => {
    const slide = mount(DragHandle, { props }).get('[role=slider]')
    expect(slide.attributes()).toMatchObject({
      'aria-label': 'Planned readings',
      'aria-valuenow': '25',
      'aria-valuemin': '5',
      'aria-valuemax': '100',
      'aria-valuetext': '25 readings',
      tabindex: '0',
    })
    expect(slide.attributes('style')).toContain(`left: ${props.scale.at(25)}px`)
  })

  it('is moved by the keys of a slider, and leaves other keys alone', async () => {
    const handle = mount(DragHandle, { props })
    for (const key of ['ArrowRight', 'ArrowLeft', 'PageUp', 'Home', 'End', 'a', 'Tab'])
      await handle.get('[role=slider]').trigger('keydown', { key })
    expect(handle.emitted('drag')).toEqual([[26], [24], [35], [5], [100]])
  })
})
