// Links to worked examples. Their codes are those the program itself gives these statements, so seeding again changes nothing.
const examples = [
  { code: 'yzkaaz5e95', field: 'Q', statement: '[6] = [2] + [3] + \\eta[2][3]' },
  { code: '1kjdcwpf34', field: 'F_7', statement: '<3> = <5>' },
  { code: '5axew0372n', field: 'Q_5', statement: '[5][-5] = 0' },
];

export async function up({ context: { queryInterface } }) {
  await queryInterface.bulkInsert('permalinks', examples, { ignoreDuplicates: true });
}
