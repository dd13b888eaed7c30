/** The line icons, each the path of a drawing in a box of 24: two pixels wide, with square ends. */
export const ICONS = {
  'arrow-in': 'M12 3v12M7 10l5 5 5-5M5 20h14',
  'arrow-out': 'M12 16V4M7 9l5-5 5 5M5 20h14',
  'arrow-right': 'M4 12h15M13 6l6 6-6 6',
  'box': 'M4 9l2-5h12l2 5v11H4zM4 9h16M10 14h4',
  'gauge': 'M5 18a9 9 0 1 1 14 0M12 13l4-4',
  'barrier': 'M3 7h18v6H3zM9 7l-3 6M15 7l-3 6M21 7l-3 6M6 13v7M18 13v7',
  'cross-out': 'M12 4a8 8 0 1 0 0 16a8 8 0 1 0 0-16M6.5 6.5l11 11',
  'keys': 'M4 4h16v16H4zM9.5 4v16M14.5 4v16M4 9.5h16M4 14.5h16',
  'lens': 'M10.5 4a6.5 6.5 0 1 0 0 13a6.5 6.5 0 1 0 0-13M15 15l6 6',
  'lock-open': 'M5 11h14v9H5zM8 11V7a4 4 0 0 1 7.7-1.5',
  'pin': 'M12 21c5-5.2 7-8.4 7-12a7 7 0 0 0-14 0c0 3.6 2 6.8 7 12zM9 9l2.2 2.2L15 7.4',
  'question': 'M8 8.5a4 4 0 1 1 6.2 3.3c-1.5 1-2.2 1.8-2.2 3.7M12 20h.01',
  'ring': 'M8.94 4.61a8 8 0 0 1 6.12 0M19.39 8.94a8 8 0 0 1 0 6.12M15.06 19.39a8 8 0 0 1-6.12 0M4.61 15.06a8 8 0 0 1 0-6.12',
  'rub-out': 'M9 5h12v14H9l-6-7zM12.5 9.5l5 5M17.5 9.5l-5 5',
  'scan': 'M3 7V3h4M17 3h4v4M21 17v4h-4M7 21H3v-4M8 8h3v3H8zM16 8v3M8 16h3M16 16h.01',
  'sound-off': 'M3 9h4l5-5v16l-5-5H3zM16 9.5l5 5M21 9.5l-5 5',
  'sound-on': 'M3 9h4l5-5v16l-5-5H3zM16 9a4.5 4.5 0 0 1 0 6M19 6a9 9 0 0 1 0 12',
  'swap': 'M4 8h16M16 4l4 4-4 4M20 16H4M8 12l-4 4 4 4',
  'tag': 'M3 3h8l10 10-8 8L3 11zM7.5 7.5h.01',
  'torch': 'M7 3h10v4l-3 4v10h-4V11L7 7zM7 7h10',
  'truck': 'M2 5h12v11H2zM14 9h4l4 4v3h-8M4.5 18a2 2 0 1 0 4 0a2 2 0 1 0-4 0M15.5 18a2 2 0 1 0 4 0a2 2 0 1 0-4 0',
  'turn-back': 'M9 5l-5 5 5 5M4 10h10a5 5 0 0 1 0 10H9',
  'weight': 'M6 8h12l3 12H3zM12 8a2.5 2.5 0 1 0 0-5a2.5 2.5 0 0 0 0 5',
  'wind': 'M3 9h11a3 3 0 1 0-3-3M3 14h15a3 3 0 1 1-3 3M3 19h6',
} as const

export type IconName = keyof typeof ICONS
