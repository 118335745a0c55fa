/** Words of the page that people see before they sign in. */
export const home = {
  kind: 'For concrete flatwork contractors',
  title: 'Ordered, delivered, billed: strike\u00a0off what agrees.',
  says: 'The order was a phone call. The delivery is a paper ticket handed to a foreman with wet gloves. The bill is a statement of a few hundred lines at the end of the month. Strikeoff lays the three side by side, works out what each supplier should charge, and shows what does not agree, to the cent, before the discount date.',
  signIn: 'Sign in',
  signUp: 'Set up a company',
  exampleTitle: 'One truck on three copies',
  exampleSays: 'An invented load. The line through it is the strike-off: this part agrees.',
  job: 'Job',
  mix: 'Mix',
  load: 'Load',
  onSite: 'On site',
  waiting: 'Waiting',
  ticket: 'Ticket',
  line: 'Line',
  concrete: 'Concrete',
  waitingAgreed: '5 min a yard free',
  finding: 'Waiting not owed',
  findingSays: '46 minutes on site, 50 minutes free for 10 yards: nothing is owed.',
  peopleTitle: 'Who works with it',
  people: [
    {
      who: 'Foreman',
      what: 'Photographs each ticket between two trucks and sees the running yards against the order. The photo is never lost, signal or not. No prices unless the owner says so.',
    },
    {
      who: 'Bookkeeper',
      what: 'Brings in the statement as the supplier sends it, strikes off what agrees from the keyboard, and sends back what does not with its ticket and its arithmetic.',
    },
    {
      who: 'Owner',
      what: 'Sees which pours ran over and why, which supplier costs what all-in, and how much money is still open with each.',
    },
  ],
};

export type HomeMessages = typeof home;
