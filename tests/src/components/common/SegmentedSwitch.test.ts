import { mount } from '@vue/test-utils'
import { describe, expect, it } from 'vitest'
import SegmentedSwitch from '../../../../src/components/common/SegmentedSwitch.vue'

const props = {
  label: 'Temperature unit',
  name: 'unit',
  options: [
    { value: 'C', label: '°C' },
    { value: 'F', label: '°F' },
  ],
  modelValue: 'C',
}

describe('the segmented switch', () => {
  it('is a named group of radio buttons with the present choice', () => {
    const wrapper = mount(SegmentedSwitch, { props })
    expect(wrapper.get('legend').text()).toBe('Temperature unit')
    const inputs = wrapper.findAll<HTMLInputElement>('input[type=radio][name=unit]')
    expect(inputs.map((input) => input.element.checked)).toEqual([true, false])
  })

  it('says only a new choice', async () => {
    const wrapper = mount(SegmentedSwitch, { props })
    const [first, second] = wrapper.findAll<HTMLInputElement>('input')
    await first?.trigger('change')
    expect(wrapper.emitted('update:modelValue')).toBeUndefined()
    await second?.setValue(true)
    expect(wrapper.emitted('update:modelValue')).toEqual([['F']])
  })
})
