import type { Parameter } from '../../../shared/ranges.js'

/** Our own line drawings on a 16 × 16 ground, one for each parameter. */
export const PARAMETER_ICON_PATHS: Record<Parameter, string> = {
  // A thermometer with its scale.
  temperature:
    'M6 9.300V3.500a2 2 0 1 1 4 0v5.800a3.400 3.400 0 1 1-4 0zM8 7v5M12.500 3.500h1.500M12.500 6.500h1.500',
  // A drop on a blade of moss.
  'relative-humidity':
    'M8 1.800c2.700 3.300 4 5.600 4 7.500a4 4 0 0 1-8 0c0-1.900 1.300-4.200 4-7.500zM6.200 9.500a1.900 1.900 0 0 0 1.600 1.900',
  // Rays that strike a line: what the meter sees from above.
  'uv-index': 'M3 13.500h10M8 1.500v7M5.800 6.700 8 8.900l2.200-2.200M3 2.500l1.800 5M13 2.500l-1.800 5',
  // A day of which one part is dark.
  photoperiod: 'M8 2a6 6 0 1 1 0 12A6 6 0 0 1 8 2zM8 2v12M10 4.800v6.400M12 6v4',
  // A lamp with its shade, and an hour hand.
  'basking-heat-hours': 'M5.500 2h5l2 5h-9zM8 9.500v3.500l2.500 1.500M5 9.500l-1 1.500M11 9.500l1 1.500',
}
