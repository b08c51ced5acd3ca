/**
 * The text of a commented study to begin from. It is a right study as it stands; lines that begin with # and
 * two spaces, or # and a key, are further keys to uncomment, and stay right when all of them are.
 *
 * @param input `title`: of the report. `weatherFile`: as the study is to name it, relative to itself or absolute.
 */
export const studyTemplate = (input: { title: string; weatherFile: string }): string => `\
# A study for trackworth: is tracking worth it here? Run: trackworth compare, with the name of this file.
#
# Write key: value, with a space after the colon. Groups are set in by two spaces, not by tabs, or stand in braces:
# { dc: 12 kW, inverter: 10 kW }. Numbers are in the unit named here, or carry their own: 100 mm, 12 ft, 115 mph, 6 %.
# What follows a # is a comment. Lines such as #site: are keys that wait: remove the # to use them.
# Blank is not zero: what is left blank is named in the report as not counted, or has the default named here.
# For help while you type: trackworth schema > study.schema.json, and point your editor's YAML support at that file.

title: ${JSON.stringify(input.title)}

# The hourly typical year: an EPW, TMY2 or TMY3 file, or a plain table; gzipped files are read as they are.
weather:
  file: ${JSON.stringify(input.weatherFile)} # relative to this study, or absolute
#  label: end          # what the file's times mark of their hour: end, start or middle. Blank: as its format says
#  add_minutes: 0      # minutes to add to the file's times where its clock is off
#  accept_clock: false # true: you have looked at the clock finding and stand by the file
# A plain table also needs a group that says which column holds what, such as
# table: { time: Time, ghi: GHI, dni: DNI, dhi: DHI, temperature: Air, wind: { column: Wind, unit: mph } }

# Where the array stands. Blank: as the weather file says.
#site:
#  latitude: 40.0     # degrees, north positive
#  longitude: -105.0  # degrees, east positive
#  elevation: 1600 m  # above sea level
#  utc_offset: -7     # hours that local standard time is ahead of UTC; 5.75 or "+05:45" do too
#  roof_height: 5 m   # of the roof above ground. Blank: wind on the roof is not checked
#  skyline: { points: [ [90, 12], [105, 9], [120, 0], [240, 0], [255, 15] ] } # bearing and elevation angle, degrees
# A skyline may also be a file, or obstacles; bearings are true, or magnetic with their date or declination. Where the
# array is large, give a list of several, each with its name. Blank: the horizon is open. For example
# skyline: { name: north-east corner, file: skyline.csv, bearings: magnetic, dated: 2026-05-01 }
# skyline: { obstacles: [ { height: 6 m, distance: 20 m, from: 100, to: 130 } ] }

# Light on a tilted plane.
#sky:
#  model: perez       # perez (default), hay-davies, reindl, or isotropic, which is a lower bound
#  albedo: 0.2        # reflectance of the ground, 0 to 1 (default 0.2); file takes the weather file's own column

# The array. Blank: 1 kW without an inverter.
array:
  dc: 12 kW           # rating of the modules
  inverter: 10 kW     # AC rating. Blank: its ceiling is not counted, which flatters trackers
#  module:            # blank: power is not rounded to whole modules
#    power: 430 W
#    length: 1.76 m
#    width: 1.13 m
#    thickness: 35 mm
#    heat: -0.34 %/K  # change of power as modules warm, with its unit. Blank: -0.35 %/K, common for silicon

# The mounts to compare, each with an id of its own (lower-case letters, digits, - and _) and a kind:
#   roof-plane   parallel to a roof         fixed-tilt   a rack on the ground that does not move
#   single-axis  a tracker about one axis   dual-axis    a tracker that faces the sun
#   turntable    a tracker about an upright axis, at a tilt that it keeps
# Azimuth is clockwise from true north: 180 faces south. Tilt is in degrees, or a slope (3:12), or a grade (25 %).
# A roof or a rack read on site has bearing in place of azimuth, and slope in place of tilt, each with its error:
# bearing: { magnetic: 150, taken: facing, dated: 2026-05-01, error: 5 } # declination is applied here, once
# bearing: { true: 76, back: 257, taken: along_ridge, downslope: right } # or looking_at; back is from the far end
# bearing: { magnetic: 150, declination: 16 E } # from a map of the time, in place of the date
# slope: { reading: 3:12, error: 2 } # or 25 %, or 14 deg
# slope: { rise: 4 ft, run: 12 ft, rise_error: 1 in, run_error: 1 in } # the run is level
# gcr is the slant length of a row over the distance from row to row. Give it for all ground mounts or for none:
# where only one side has rows, no clear lead is claimed. Every price here is made up: put your quotes in.
# snow is what snow on the modules takes of each month's light: months left out have none, or a list of twelve. Any
# mount may have it; give it for all or for none. Blank: not counted.
# A dead tracker may also stand at a known angle: about one axis, or for a tracker that faces the sun.
# drive: { working: 97 %, stuck: { turn: 45, faces: east } }
# drive: { working: 97 %, stuck: { tilt: 30, azimuth: 90 } }
mounts:
  - id: ground
    kind: fixed-tilt
    tilt: best        # or degrees; best is worked out from the site's own hours (default)
    azimuth: best
    rows: { gcr: 0.45 }
#    slant: 3.5 m       # length of the rack along its slope. Blank: height is not checked
#    lower_edge: 0.8 m  # height of its lower edge above ground
#    snow: { Jan: 20 %, Feb: 15 %, Mar: 0, Apr: 0, May: 0, Jun: 0, Jul: 0, Aug: 0, Sep: 0, Oct: 0, Nov: 5 %, Dec: 20 % }
#    cost: { capital_per_kw: 1700, upkeep_per_kw: 15 } # blank: mounts are ranked by energy
  - id: tracker
    kind: single-axis
#    axis: { azimuth: 180 } # a tilted axis falls that way: axis: { azimuth: 180, tilt: 5 }. Blank: level, north-south
#    ground: { slope: 6 %, falls_toward: 200 } # which axis and rows follow, in place of axis tilt. Blank: level
#    slope_limits: { along: 15 %, across: 10 % } # the steepest ground that the maker allows. Blank: not checked
    swing: 60         # greatest turn either way from flat, degrees (default 60)
#    cloudy: track     # or flat: lie flat while the sky is overcast. Blank: track
    rows: { gcr: 0.40, low_sun: backtrack } # or shade: stay on the sun and take the shade of the next row
#    slant: 2.4 m
#    axis_height: 1.5 m # above ground
#    drive:
#      working: 97 %  # share of the time. Blank: downtime is not counted, which flatters the tracker
#      stuck: flat    # how it stands when it does not work: flat, or average for where it stopped; needed with working
#      visits: 2      # repair visits a year: listed, not priced
#      own_use: 0.3 % # of the yield, used by the drive itself
#    stow: # parking in wind. Blank: not counted, which flatters the tracker
#      gust: 18 m/s    # it parks when the weather's hourly wind at 10 m times gust_factor reaches this
#      gust_factor: 1.5 # gust over hourly mean (default 1.5, an assumption)
#      release: 12 m/s # it goes back to work once gusts stay below this. Blank: as gust
#      hold: 3 h       # for so long. Blank: 0
#      angle: 30       # turn from flat while parked; on a mast, tilt towards the equator. Blank: 0, flat
#      faces: west     # the side to which it is turned
#    cost: # those without _per_kw are for the whole array
#      capital_per_kw: 2100
#      capital: 500
#      upkeep_per_kw: 22
#      renewals: [ { what: drive, year: 12, cost: 800 } ]
#  - id: roof
#    kind: roof-plane
#    tilt: 3:12       # of the roof itself
#    azimuth: 166     # the way the roof faces
#    air_behind: 100 mm # gap between roof and modules. Blank: rise above the roof is not checked
#    cost: { capital_per_kw: 1600, upkeep_per_kw: 12 }
#  - id: mast
#    kind: dual-axis  # without rows it is a lone mast
#    turns: { from: 60, to: 300 } # azimuths that it can face, clockwise. Blank: all round
#    elevation: { lowest: 15, highest: 85 } # of the sun that it can face: 90 less its tilt. Blank: 0 to 90
#    cost: { capital_per_kw: 3100, upkeep_per_kw: 30 }
#  - id: table
#    kind: turntable  # takes turns too; its drive may be stuck: equator
#    tilt: best       # or degrees; best is where it collects most, turning (default)
#    cost: { capital_per_kw: 2500, upkeep_per_kw: 25 }

# Losses that all mounts share. Blank: not counted.
#losses:
#  dirt: 2 %
#  module_spread: 1 %
#  cables: 1.5 %
#  conversion: 3.5 %

# For the cost per kWh.
#finance:
#  real_rate: 6 %     # discount rate above inflation. Blank: cost per kWh at 4, 7 and 10 %
#  years: 25
#  ageing: 0.5 %      # yield lost per year. Blank: not counted
#  currency: USD

# Wind screening. It does not replace the local code and a licensed engineer.
#wind:
#  design_gust: 115 mph # the code's 3-second gust at 10 m, not the wind of a weather file
#  exposure: C          # B: town or wood, C: open country, D: open water or flat shore; no default
#  limits: { roof_projection: 10 in, height: 3 m } # what local rules allow. Blank: not checked

# What the choice is to serve: lowest cost per kWh, most kWh per kW, or best worst month.
# Blank: cost per kWh where costs are given, else kWh per kW.
# A programme's least TOF or TSRF of fixed planes is held against each of them. Blank: not checked.
#advice: { objective: lowest cost per kWh, minimum_tof: 75 %, minimum_tsrf: 75 % }

# The fixed mount that gains are counted from. Blank: the ground rack with the most kWh per kW.
#compare_with: ground
`;
