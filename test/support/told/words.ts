/** An invented shop's words: what it makes, of what, on what, and what is said about it. */
export const PARTS =
  'knob lever thumbscrew collar spacer handwheel adjuster bushing plunger grip cap nut ferrule handle stud dial sleeve ring plug pull button cover pivot spindle roller stopper clamp bolt wheel barrel body end tube mandrel punch arbor driver drawbar lid pointer'.split(
    ' ',
  );
export const PRODUCTS =
  'bevel jig|tilt table|camera slider|burr grinder|oil can|door stop|pen|torch|marking gauge|bench vise|fly reel|bicycle bell|music stand|spirit stove|hand drill|tripod|telescope|sundial|loom|kite winder|coffee press|pepper mill|book press|honing guide|dividers|plumb bob|tap wrench|test weight|valve block|fuel rail|bleed screw|gas regulator|sample holder|optics mount|laser stage|surface gauge|dial stand|tool post|steady rest|dividing head'.split(
    '|',
  );
export const MATERIALS =
  '1018|1045|12L14|4140|303|304|316|416|brass|brass 360|bronze|6061|2024|7075|aluminium|copper|titanium|acetal|mild steel|stainless'.split(
    '|',
  );
export const PATTERNS =
  'straight|diamond|diamond raised|diagonal left|diagonal right|square|RGE|RAA'.split('|');
export const PITCHES = '21 tpi|14 tpi|33 tpi|96dp|64dp|128dp|0.8|1.0 pitch|0.6|1.2|m0.3|0.5'.split(
  '|',
);
export const SIZES =
  '0.25|3/8|0.375|1/2|0.500|5/8|0.625|3/4|0.750|7/8|0.875|1.000|1-1/8|1.125|1-1/4|1.250|6mm|8mm|10mm|12mm|16mm|19mm|20mm|25mm|32mm'.split(
    '|',
  );
export const MACHINES =
  'big lathe|turret 2|long bed|bench 4|corner lathe|new slant bed|old gap bed'.split('|');
export const PEOPLE = 'Ada Ben Kim Ola Priya Tomas Ines Yuki Marek Femi Lotte Joss'.split(' ');
export const NOTES =
  'first turn left a gap|flaking at the end of the pass|double track on the second part|came out shallow near the tailstock|bent a little, steady needed|pin ran dry|crest measured high|teeth clean all round|chamfer was too small to start|coolant on, no chips left in|good from the first part|wheel looked dull under the glass|burr on the leading edge|ran slower than the card|whole batch within limits|count was one over|needs a longer dwell|seized on the pin after lunch|depth by feel, then measured|customer wants it finer|left it as it is|plate it after|keep the sharp corner|hold it in the soft jaws|centre was loose'.split(
    '|',
  );
