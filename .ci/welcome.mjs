const accounts = [
  ['ines.arrow@lindqvist-arrow.example', 'administrator'],
  ['tomas.lindqvist@lindqvist-arrow.example', 'engineer of record, licensed'],
  ['mira.oduya@lindqvist-arrow.example', 'engineer'],
  ['jonas.weir@lindqvist-arrow.example', 'checker'],
];

/** What launch prints when everything runs. The demo's passwords are invented and known to everybody. */
export function welcome({ address, demoFolder }) {
  const demo = [
    'Demo office Lindqvist & Arrow; every password is: plumb-line-and-level',
    ...accounts.map(([email, role]) => `  ${email.padEnd(40)} ${role}`),
    `Key file of the demo's engineer of record: ${demoFolder}/tomas-lindqvist.p12, password: plumb-line`,
    `Mail that the demo sends: ${address}/demo/mail`,
    '',
  ];
  return [
    '',
    `Fairhand is at ${address}`,
    '',
    ...(demoFolder ? demo : []),
    'Ctrl C stops everything; what was entered stays.',
  ].join('\n');
}
