import { stringify } from 'yaml';

/** A lesson to begin with. */
export const lessonStart = (title: string): string => `# ${title}\n\nWhy this matters on site.\n`;

/**
 * An exercise to begin with: one carrier behind a lead, sometimes with company, and its level asked for.
 * It is whole and can be proven as it stands, so that an author changes what works.
 */
export const exerciseStart = (slug: string, title: string): string => `slug: ${slug}
title: ${stringify(title, { lineWidth: 0 }).trim()}
client: Northmoor Telemetry

# What the apprentice reads. {name} and {name | decimals} stand for values listed under shown.
situation: |
  A transmitter at {carrierHz/1e6 | 3} MHz is to be checked before it goes back into service.
  Your lead loses {leadLossDb | 1} dB at this frequency. What level does the transmitter give, **at the coupler’s port**?
plane: the coupler’s port
chain:
  - { part: box, label: Transmitter }
  - { part: box, label: Coupler, branch: to the antenna }
  - { part: plane, label: answer for this plane }
  - { part: lead, label: '{leadLossDb | 1} dB lead' }
  - { part: box, label: Receiver }
leads:
  - label: Lead from the coupler
    loss: [{ frequencyHz: 450.0e+6, lossDb: =leadLossDb }]
cautions:
  - Never key a transmitter into the receiver except through the coupler. Greatest input +27 dBm. Check for DC first.

receiver: field

# Drawn anew for every attempt.
parameters:
  channel: { draw: integer, from: 0, to: 38 }
  carrierDbm: { draw: step, from: -20, to: -11, step: 0.1 }
  leadLossDb: { draw: step, from: 4.3, to: 5.7, step: 0.1 }
  neighbour: { draw: choice, of: [none, carrier] }
derived:
  carrierHz: =450.0125e6 + 25e3*channel
shown: [carrierHz, leadLossDb]

# What is on the cable.
scene:
  emitters:
    - { kind: cw, frequencyHz: =carrierHz, levelDbm: =carrierDbm }
    - { kind: cw, when: { neighbour: carrier }, frequencyHz: =carrierHz + 300e3, levelDbm: =carrierDbm - 20 }
  path:
    - { frequencyHz: 450.0e+6, lossDb: =leadLossDb }

# As the last person left it.
start:
  centreHz: 450.5e+6
  spanHz: 2.0e+6
  referenceDbm: 0

questions:
  - id: level
    text: Level of the carrier at the coupler’s port
    quantity: { kind: marker, atHz: =carrierHz }
    unit: dBm
    tolerance: { absolute: 1.0 }
    digits: 1
    mistakes:
      - { kind: lead-left-out }
      - { kind: lead-wrong-sign }

hints:
  - What has the lead done to the level on the way to you?

# How it is taught: done once with each seed by the proof.
method:
  - do: set
    settings: { centreHz: =carrierHz, spanHz: 200000, correctionDb: =leadLossDb }
    why: The carrier in the middle, the lead’s loss added back.
  - do: sweep
    sweeps: 1
  - do: read
    reading: { kind: peak }
    as: levelDbm
    why: An unmodulated carrier’s peak is its power.
  - do: answer
    question: level
    value: =levelDbm
    reading: levelDbm

benchTimeS: 600
tries: 5
`;
