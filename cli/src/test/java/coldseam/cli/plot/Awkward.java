package coldseam.cli.plot;

/** Details that are hard to draw: very large beside very small, turned, round. */
final class Awkward {
  static final String SLAB_EDGE =
      """
      coldseam: 1
      title: Slab edge on the ground, twenty metres of soil
      materials:
        masonry: {conductivity: 0.6}
        board: {conductivity: 0.035}
        concrete: {conductivity: 2.0}
        soil: {conductivity: 2.0}
        screed: {conductivity: 1.4}
        foil: {conductivity: 160}
      spaces:
        indoors: {temperature: 20, humidity: 55 %, exposure: inside}
        outdoors: {temperature: -5, exposure: outside}
      section:
        - {fill: indoors, box: [-4000, 0, 0, 1500]}
        - {fill: outdoors, box: [300, -300, 20300, 1500]}
        - {fill: soil, box: [-4000, -20000, 20300, -300]}
        - {fill: masonry, box: [0, -800, 200, 1500]}
        - {fill: board, box: [200, -800, 300, 1500]}
        - {fill: concrete, box: [-4000, -300, 0, -150]}
        - {fill: board, box: [-4000, -150, 0, -60]}
        - {fill: screed, box: [-4000, -60, 0, 0]}
        - {fill: foil, box: [0, 0, 200, 1]}
      flanks:
        wall: {cut: top}
      psi:
        internal: {between: [indoors, outdoors], dimensions: internal, subtract: [{flank: wall}]}
      """;

  static final String TURNED_SHEET =
      """
      coldseam: 1
      title: A foil of a tenth of a millimetre across an insulated wall, turned and far away
      view: plan
      materials:
        lining: {conductivity: 0.25}
        wool: {conductivity: 0.035}
        foil: {conductivity: 160}
        sheathing: {conductivity: 0.13}
      spaces:
        indoors: {temperature: 20, humidity: 50 %, exposure: inside}
        outdoors: {temperature: -5, exposure: outside}
      section:
        - group:
            - {fill: indoors, box: [-300, 0, 0, 1200]}
            - {fill: outdoors, box: [200, 0, 500, 1200]}
            - {fill: lining, box: [0, 0, 12.5, 1200]}
            - {fill: wool, box: [12.5, 0, 188, 1200]}
            - {fill: sheathing, box: [188, 0, 200, 1200]}
            - {fill: foil, box: [12.5, 600, 188, 600.1]}
          rotate: {by: 17, about: [0, 0]}
          move: [10000000, 10000000]
      psi:
        internal: {between: [indoors, outdoors], dimensions: internal}
        external: {between: [indoors, outdoors], dimensions: external}
      """;

  static final String PIPE =
      """
      coldseam: 1
      title: An insulated pipe
      materials:
        steel: {conductivity: 50}
        insulation: {conductivity: 0.035}
      spaces:
        water: {temperature: 60, film: 0.001, exposure: inside}
        duct: {temperature: 10, humidity: 70 %, exposure: inside}
      section:
        - {fill: duct, box: [-150, -150, 150, 150]}
        - {fill: insulation, disc: {centre: [0, 0], radius: 70}}
        - {fill: steel, disc: {centre: [0, 0], radius: 30}}
        - {fill: water, disc: {centre: [0, 0], radius: 27}}
      """;

  /** Twelve layers from 1 to 60 mm, one film of each kind, a given flow. */
  static final String MANY_LAYERS =
      """
      coldseam: 1
      title: Many thin layers with names that are long enough to be in each other's way
      materials:
        first lining board: {conductivity: 0.25}
        vapour control layer: {conductivity: 0.4}
        service zone insulation: {conductivity: 0.036}
        second lining board: {conductivity: 0.13}
        structural insulation: {conductivity: 0.038}
        bracing sheet: {conductivity: 60}
        sheathing board: {conductivity: 0.12}
        outer insulation: {conductivity: 0.044}
        levelling coat: {conductivity: 0.8}
        adhesive: {conductivity: 0.9}
        facing brick slips: {conductivity: 0.77}
        outer paint: {conductivity: 0.5}
      spaces:
        warm room of the house: {temperature: 21.5, humidity: 55 %, exposure: inside}
        open air: {temperature: -12, exposure: outside}
      section:
        - stack: {face: [[0, 0], [0, 300]], towards: right}
          layers:
            - [first lining board, 12.5]
            - [vapour control layer, 1]
            - [service zone insulation, 40]
            - [second lining board, 15]
            - [structural insulation, 60]
            - [bracing sheet, 1]
            - [sheathing board, 12]
            - [outer insulation, 60]
            - [levelling coat, 4]
            - [adhesive, 3]
            - [facing brick slips, 15]
            - [outer paint, 1]
      stretches:
        the whole of the inner face: {side: left, space: warm room of the house}
        the whole of the outer face: {side: right, space: open air}
      U: {of: wall, between: [warm room of the house, open air], width: 300}
      points:
        inner face: [0, 150]
        outer face: [224.5, 150]
        A: [100, 150]
        B: [101, 150]
      """;

  private Awkward() {}
}
