const signs: Readonly<Record<string, string>> = {
  '\\': '\\textbackslash{}',
  '{': '\\textbraceleft{}',
  '}': '\\textbraceright{}',
  '^': '\\textasciicircum{}',
  '~': '\\textasciitilde{}',
  '<': '\\textless{}',
  '>': '\\textgreater{}',
  $: '\\$',
  '&': '\\&',
  '#': '\\#',
  _: '\\_',
  '%': '\\%',
};

/** Any text, for TeX outside of mathematics. Braces go by their names, so that programs which count them count right. */
export const texText = (text: string): string =>
  text.replace(/[\\{}^~<>$&#_%]/g, (sign) => signs[sign] ?? sign).replace(/\s+/g, ' ');
