/** What every result is handed out with, whatever the job. Screens, sheets and the command line show these words. */
export const STANDING_CAUTIONS: readonly string[] = [
  'This is an aid to a licensed engineer, who judges and answers for the design; it does not replace that judgement.',
  "Local codes, the owner's specification and the crane maker's data govern wherever they ask for more.",
  "Have the crane's maker confirm wheel loads, wheel spacings and clearances before they are relied on.",
  'Only the checks listed are made. What is listed as not covered has not been looked at and must be checked by other means.',
  'Have the result checked independently before it is used.',
]
