/** The text families of the demo world sign: version 1. A line that begins with "# " is a heading. */
export const demoWaiver = {
  version: 1,
  title: "Agreement for outings of the Saltgrass Listening Club",
  body: `# What this is

This is an agreement between your family and the Saltgrass Listening Club. Please read all of it before you sign. If anything is not clear, call us, and we will read it with you. You sign once for each outing.

# What we do

We take blind and partially sighted young people to public land to listen, to record and to touch. A day lasts two to four hours. We go at the pace of the group, on paths, boardwalks and beaches. At least two adults who are cleared to work with children come along on every outing, and one of them is trained in first aid.

# What can go wrong

Public land is not a playground. Ground can be wet, loose or uneven. Tides, waves, wind, cold, sun and heat can be stronger than we planned for. There are plants that sting, insects that bite and edges without a rail. People can slip, fall, get cold or get hurt, and in rare cases badly. We plan to make this less likely, but no plan takes all of it away.

# What we promise

We visit each place before the day. We check that enough adults come for the needs of the group. We call the outing off, or cut it short, when weather, water or the number of adults makes it unsafe.

# What you agree to

You are the legal guardian of the child you register. What you have told us about your child is true, and you will tell us if it changes. You send your child in clothes for the weather, and you or somebody on your list collects your child on time. You have read what can go wrong, and you accept the risks that belong to a careful day outdoors. You will not ask the club, its volunteers or the land agency to pay for harm that comes from those risks. You do not give up any right you have if somebody harms your child on purpose or through gross carelessness.

# If your child is hurt or ill

We give first aid and call you at once, in the order of your list. In an emergency we call the local emergency number first. If we cannot reach you, you agree that medical staff may give the care your child needs right away. You pay for care that your insurance does not.

# Photos and recordings

This agreement does not allow photos or recordings of your child. We ask about them in your child's profile, and you can say no and still come.

# Changing your mind

You can withdraw from the outing at any time before it begins. What you signed stays on file with the date.

# Before this text is used

This text is to be reviewed by counsel in the programme's state before it is used.
`,
};
