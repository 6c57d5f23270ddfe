/** @type {import('tailwindcss').Config} */
export default {
  content: ['./src/**/*.{astro,ts,tsx}'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      paper: '#fbf9f4',
      ink: '#1f2430',
      soft: '#5b6070',
      rule: '#d9d3c7',
      ember: '#b8431f',
      tide: '#14606e',
      ochre: '#8a6100',
      moss: '#3f6b3a',
      boundary: '#3c4a63',
      defect: '#c9b98f',
      umklapp: '#7d4a35',
    },
    fontFamily: { serif: ['"Source Serif 4"', 'Georgia', '"Times New Roman"', 'serif'] },
    fontSize: {
      axis: ['13px', '18px'],
      margin: ['14px', '20px'],
      table: ['16px', '24px'],
      body: ['17px', '27px'],
      section: ['20px', '28px'],
      sentence: ['25px', '38px'],
      title: ['40px', '46px'],
    },
    fontWeight: { normal: '400', semibold: '600' },
    borderRadius: { none: '0' },
    extend: {},
  },
};
