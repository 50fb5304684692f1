//! Selectors of processes, made from the catalogue; do not edit: `MOISTAIR_WRITE_HEADER=1 cargo test -p moistair-ffi --test header`.

/// air.from_psychrometer. Takes 0 dry_bulb [°C], 1 wet_bulb [°C], 2 bulb [choice: 0 water 1 ice], 3 coefficient [1/K], 4 pressure [Pa];
/// gives 0–2 air (state).
pub const MOISTAIR_PROCESS_AIR_FROM_PSYCHROMETER: i32 = 100;

/// air.psychrometer_reading. Takes 0–2 air (state), 3 bulb [choice: 0 water 1 ice], 4 coefficient [1/K]; gives 0 wet_bulb [°C].
pub const MOISTAIR_PROCESS_AIR_PSYCHROMETER_READING: i32 = 101;

/// air.at_pressure. Takes 0–2 air (state), 3 pressure [Pa]; gives 0–2 air (state).
pub const MOISTAIR_PROCESS_AIR_AT_PRESSURE: i32 = 102;

/// air.at_temperature_and_pressure. Takes 0–2 air (state), 3 dry_bulb [°C], 4 pressure [Pa]; gives 0–2 air (state).
pub const MOISTAIR_PROCESS_AIR_AT_TEMPERATURE_AND_PRESSURE: i32 = 103;

/// air.dew_point_at. Takes 0–2 air (state), 3 pressure [Pa]; gives 0 dew_point [°C].
pub const MOISTAIR_PROCESS_AIR_DEW_POINT_AT: i32 = 104;

/// air.frost_point_at. Takes 0–2 air (state), 3 pressure [Pa]; gives 0 frost_point [°C].
pub const MOISTAIR_PROCESS_AIR_FROST_POINT_AT: i32 = 105;

/// saturation_temperature_after. Takes 0 given [choice: code of a quantity], 1 value [°C], 2 pressure [Pa], 3 wanted [choice: code of a
/// quantity], 4 new_pressure [Pa]; gives 0 wanted [°C].
pub const MOISTAIR_PROCESS_SATURATION_TEMPERATURE_AFTER: i32 = 106;

/// stream. Takes 0–2 air (state), 3 dry_air_flow [kg/s]; gives 0–2 air (state), 3 dry_air_flow [kg/s], 4 volume_flow [m³/s].
pub const MOISTAIR_PROCESS_STREAM: i32 = 200;

/// stream.from_volume_flow. Takes 0–2 air (state), 3 volume_flow [m³/s]; gives 0–2 air (state), 3 dry_air_flow [kg/s], 4 volume_flow
/// [m³/s].
pub const MOISTAIR_PROCESS_STREAM_FROM_VOLUME_FLOW: i32 = 201;

/// stream.from_standard_volume_flow. Takes 0–2 air (state), 3 volume_flow [m³/s], 4 reference_density [kg/m³]; gives 0–2 air (state),
/// 3 dry_air_flow [kg/s], 4 volume_flow [m³/s].
pub const MOISTAIR_PROCESS_STREAM_FROM_STANDARD_VOLUME_FLOW: i32 = 202;

/// wet_stream. Takes 0–2 air.air (state), 3 air.liquid [kg/kg], 4 air.ice [kg/kg], 5 dry_air_flow [kg/s]; gives 0–2 air.air (state),
/// 3 air.liquid [kg/kg], 4 air.ice [kg/kg], 5 air.total_water [kg/kg], 6 air.specific_enthalpy [J/kg], 7 air.is_wet [flag], 8 dry_air_flow
/// [kg/s].
pub const MOISTAIR_PROCESS_WET_STREAM: i32 = 203;

/// wet_air. Takes 0–2 air (state), 3 liquid [kg/kg], 4 ice [kg/kg]; gives 0–2 air (state), 3 liquid [kg/kg], 4 ice [kg/kg], 5 total_water
/// [kg/kg], 6 specific_enthalpy [J/kg], 7 is_wet [flag].
pub const MOISTAIR_PROCESS_WET_AIR: i32 = 204;

/// wet_air.from_enthalpy_and_water. Takes 0 specific_enthalpy [J/kg], 1 total_water [kg/kg], 2 freezing [choice: 0 equilibrium 1
/// supercooled], 3 pressure [Pa]; gives 0–2 air (state), 3 liquid [kg/kg], 4 ice [kg/kg], 5 total_water [kg/kg], 6 specific_enthalpy
/// [J/kg], 7 is_wet [flag].
pub const MOISTAIR_PROCESS_WET_AIR_FROM_ENTHALPY_AND_WATER: i32 = 205;

/// wet_air.from_dry_bulb_and_water. Takes 0 dry_bulb [°C], 1 total_water [kg/kg], 2 freezing [choice: 0 equilibrium 1 supercooled],
/// 3 pressure [Pa]; gives 0–2 air (state), 3 liquid [kg/kg], 4 ice [kg/kg], 5 total_water [kg/kg], 6 specific_enthalpy [J/kg], 7 is_wet
/// [flag].
pub const MOISTAIR_PROCESS_WET_AIR_FROM_DRY_BULB_AND_WATER: i32 = 206;

/// liquid_water_enthalpy. Takes 0 water_temperature [°C], 1 pressure [Pa]; gives 0 specific_enthalpy [J/kg].
pub const MOISTAIR_PROCESS_LIQUID_WATER_ENTHALPY: i32 = 207;

/// sensible.to_temperature. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 leaving_temperature [°C]; gives
/// 0–2 leaving.air (state), 3 leaving.dry_air_flow [kg/s], 4 leaving.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s],
/// 7 exchange.water_enthalpy_flow [W].
pub const MOISTAIR_PROCESS_SENSIBLE_TO_TEMPERATURE: i32 = 300;

/// sensible.with_heat. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 heat [W]; gives 0–2 leaving.air (state),
/// 3 leaving.dry_air_flow [kg/s], 4 leaving.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s],
/// 7 exchange.water_enthalpy_flow [W].
pub const MOISTAIR_PROCESS_SENSIBLE_WITH_HEAT: i32 = 301;

/// coil.to_state. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4–6 leaving (state), 7 condensate_temperature [choice: 0
/// leaving air, 1 apparatus, 2 given], 8 condensate_temperature.given [°C]; gives 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s],
/// 4 entering.volume_flow [m³/s], 5–7 leaving.air (state), 8 leaving.dry_air_flow [kg/s], 9 leaving.volume_flow [m³/s], 10 exchange.heat
/// [W], 11 exchange.water [kg/s], 12 exchange.water_enthalpy_flow [W], 13 cooling_load [W], 14 sensible [W], 15 latent [W], 16 condensate
/// [kg/s], 17 regime [choice, 0 dry, 1 wet, 2 frost, 3 partly wet], 18 sensible_heat_ratio [1].
pub const MOISTAIR_PROCESS_COIL_TO_STATE: i32 = 400;

/// coil.by_bypass_factor. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 apparatus_dew_point [°C], 5 bypass_factor [1],
/// 6 condensate_temperature [choice: 0 leaving air, 1 apparatus, 2 given], 7 condensate_temperature.given [°C]; gives 0–2 entering.air
/// (state), 3 entering.dry_air_flow [kg/s], 4 entering.volume_flow [m³/s], 5–7 leaving.air (state), 8 leaving.dry_air_flow [kg/s],
/// 9 leaving.volume_flow [m³/s], 10 exchange.heat [W], 11 exchange.water [kg/s], 12 exchange.water_enthalpy_flow [W], 13 cooling_load [W],
/// 14 sensible [W], 15 latent [W], 16 condensate [kg/s], 17 regime [choice, 0 dry, 1 wet, 2 frost, 3 partly wet], 18 sensible_heat_ratio
/// [1].
pub const MOISTAIR_PROCESS_COIL_BY_BYPASS_FACTOR: i32 = 401;

/// coil.apparatus_dew_point. Takes 0–2 entering (state), 3–5 leaving (state); gives 0 dew_point [°C], 1 bypass_factor [1].
pub const MOISTAIR_PROCESS_COIL_APPARATUS_DEW_POINT: i32 = 402;

/// coil.apparatus_dew_points. Takes 0–2 entering (state), 3–5 leaving (state); gives 0 warmer.dew_point [°C], 1 warmer.bypass_factor [1],
/// 2 colder.dew_point [°C], 3 colder.bypass_factor [1], 4 nearest [°C].
pub const MOISTAIR_PROCESS_COIL_APPARATUS_DEW_POINTS: i32 = 403;

/// coil.bypass_factor_of_rows. Takes 0 of_one_row [1], 1 rows [1]; gives 0 bypass_factor [1].
pub const MOISTAIR_PROCESS_COIL_BYPASS_FACTOR_OF_ROWS: i32 = 404;

/// coil.with_water. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 air_side [W/K], 5 water_side [W/K], 6 arrangement
/// [choice: 0 counterflow 1 cross flow], 7 water_flow [kg/s], 8 entering_water [°C], 9 specific_heat [choice: 0 of water, 2 given],
/// 10 specific_heat.given [J/(kg K)], 11 condensate_temperature [choice: 0 leaving air, 1 apparatus, 2 given],
/// 12 condensate_temperature.given [°C]; gives 0–2 air.entering.air (state), 3 air.entering.dry_air_flow [kg/s], 4 air.entering.volume_flow
/// [m³/s], 5–7 air.leaving.air (state), 8 air.leaving.dry_air_flow [kg/s], 9 air.leaving.volume_flow [m³/s], 10 air.exchange.heat [W],
/// 11 air.exchange.water [kg/s], 12 air.exchange.water_enthalpy_flow [W], 13 air.cooling_load [W], 14 air.sensible [W], 15 air.latent [W],
/// 16 air.condensate [kg/s], 17 air.regime [choice, 0 dry, 1 wet, 2 frost, 3 partly wet], 18 air.sensible_heat_ratio [1], 19 leaving_water
/// [°C], 20 dry_fraction [1], 21 coldest_surface [°C], 22 freezing [flag].
pub const MOISTAIR_PROCESS_COIL_WITH_WATER: i32 = 405;

/// coil.surface_from_rating. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 entering_water [°C],
/// 6 specific_heat [choice: 0 of water, 2 given], 7 specific_heat.given [J/(kg K)], 8 measured [choice: 0 leaving air, 1 leaving water, 2
/// heat], 9 value [°C or W], 10 conductance_ratio [1], 11 arrangement [choice: 0 counterflow 1 cross flow]; gives 0 air_side [W/K],
/// 1 water_side [W/K].
pub const MOISTAIR_PROCESS_COIL_SURFACE_FROM_RATING: i32 = 406;

/// coil.between. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4–6 leaving (state), 7 condensate_temperature [choice: 0
/// leaving air, 1 apparatus, 2 given], 8 condensate_temperature.given [°C], 9 dead_band [kg/kg]; gives 0–2 entering.air (state),
/// 3 entering.dry_air_flow [kg/s], 4 entering.volume_flow [m³/s], 5–7 leaving.air (state), 8 leaving.dry_air_flow [kg/s],
/// 9 leaving.volume_flow [m³/s], 10 exchange.heat [W], 11 exchange.water [kg/s], 12 exchange.water_enthalpy_flow [W], 13 cooling_load [W],
/// 14 sensible [W], 15 latent [W], 16 condensate [kg/s], 17 regime [choice, 0 dry, 1 wet, 2 frost, 3 partly wet], 18 sensible_heat_ratio
/// [1].
pub const MOISTAIR_PROCESS_COIL_BETWEEN: i32 = 407;

/// coil.surface_at_flows. Takes 0 air_side [W/K], 1 water_side [W/K], 2 arrangement [choice: 0 counterflow 1 cross flow],
/// 3 found_at_air_flow [kg/s], 4 found_at_water_flow [kg/s], 5 air_flow [kg/s], 6 water_flow [kg/s], 7 air_side_exponent [1],
/// 8 water_side_exponent [1]; gives 0 air_side [W/K], 1 water_side [W/K].
pub const MOISTAIR_PROCESS_COIL_SURFACE_AT_FLOWS: i32 = 408;

/// coil.load_by_water. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 load_by_air [W], 5 water_flow [kg/s],
/// 6 entering_water [°C], 7 specific_heat [choice: 0 of water, 2 given], 8 specific_heat.given [J/(kg K)], 9 leaving_water [°C]; gives
/// 0 load [W], 1 air_less_water [W].
pub const MOISTAIR_PROCESS_COIL_LOAD_BY_WATER: i32 = 409;

/// mixing.adiabatic. Takes any number of times: 0–2 streams.air.air (state), 3 streams.air.liquid [kg/kg], 4 streams.air.ice [kg/kg],
/// 5 streams.dry_air_flow [kg/s]; gives 0–2 leaving.air.air (state), 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg],
/// 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s],
/// 9 exchange.heat [W], 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W].
pub const MOISTAIR_PROCESS_MIXING_ADIABATIC: i32 = 500;

/// mixing.adiabatic_at. Takes 0 pressure [Pa], 1 freezing [choice: 0 equilibrium 1 supercooled], any number of times: 2–4 streams.air.air
/// (state), 5 streams.air.liquid [kg/kg], 6 streams.air.ice [kg/kg], 7 streams.dry_air_flow [kg/s]; gives 0–2 leaving.air.air (state),
/// 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg],
/// 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W], 10 exchange.water [kg/s],
/// 11 exchange.water_enthalpy_flow [W].
pub const MOISTAIR_PROCESS_MIXING_ADIABATIC_AT: i32 = 501;

/// mixing.remainder. Takes 0 total_flow [kg/s], 1–3 part.air (state), 4 part.dry_air_flow [kg/s], 5–7 air (state); gives 0–2 air (state),
/// 3 dry_air_flow [kg/s], 4 volume_flow [m³/s].
pub const MOISTAIR_PROCESS_MIXING_REMAINDER: i32 = 502;

/// mixing.outdoor_air_from_readings. Takes 0 quantity [choice: code of a quantity], 1 outdoor.value [unit of the quantity],
/// 2 outdoor.standard_uncertainty [unit of the quantity], 3 outdoor.quality [choice: 0 good 1 repaired 2 refused], 4 returned.value [unit
/// of the quantity], 5 returned.standard_uncertainty [unit of the quantity], 6 returned.quality [choice: 0 good 1 repaired 2 refused],
/// 7 mixed.value [unit of the quantity], 8 mixed.standard_uncertainty [unit of the quantity], 9 mixed.quality [choice: 0 good 1 repaired 2
/// refused], 10 acceptable [1]; gives 0 fraction [1], 1 standard_uncertainty [1], 2 fraction_status [choice, 0 determined, 1 uncertain, 2
/// below zero, 3 above one, 4 indeterminate], 3 quality [choice, 0 good, 1 repaired, 2 refused].
pub const MOISTAIR_PROCESS_MIXING_OUTDOOR_AIR_FROM_READINGS: i32 = 510;

/// mixing.outdoor_air_from_air. Takes 0 quantity [choice: code of a quantity], 1 outdoor.dry_bulb.value [unit of the quantity],
/// 2 outdoor.dry_bulb.standard_uncertainty [unit of the quantity], 3 outdoor.dry_bulb.quality [choice: 0 good 1 repaired 2 refused],
/// 4 outdoor.humidity.value [unit of the quantity], 5 outdoor.humidity.standard_uncertainty [unit of the quantity],
/// 6 outdoor.humidity.quality [choice: 0 good 1 repaired 2 refused], 7 outdoor.humidity_quantity [choice: code of a quantity],
/// 8 returned.dry_bulb.value [unit of the quantity], 9 returned.dry_bulb.standard_uncertainty [unit of the quantity],
/// 10 returned.dry_bulb.quality [choice: 0 good 1 repaired 2 refused], 11 returned.humidity.value [unit of the quantity],
/// 12 returned.humidity.standard_uncertainty [unit of the quantity], 13 returned.humidity.quality [choice: 0 good 1 repaired 2 refused],
/// 14 returned.humidity_quantity [choice: code of a quantity], 15 mixed.dry_bulb.value [unit of the quantity],
/// 16 mixed.dry_bulb.standard_uncertainty [unit of the quantity], 17 mixed.dry_bulb.quality [choice: 0 good 1 repaired 2 refused],
/// 18 mixed.humidity.value [unit of the quantity], 19 mixed.humidity.standard_uncertainty [unit of the quantity], 20 mixed.humidity.quality
/// [choice: 0 good 1 repaired 2 refused], 21 mixed.humidity_quantity [choice: code of a quantity], 22 pressure [Pa], 23 acceptable [1];
/// gives 0 fraction [1], 1 standard_uncertainty [1], 2 fraction_status [choice, 0 determined, 1 uncertain, 2 below zero, 3 above one, 4
/// indeterminate], 3 quality [choice, 0 good, 1 repaired, 2 refused].
pub const MOISTAIR_PROCESS_MIXING_OUTDOOR_AIR_FROM_AIR: i32 = 511;

/// mixing.outdoor_air_from_flows. Takes 0 outdoor.value [unit of the quantity], 1 outdoor.standard_uncertainty [unit of the quantity],
/// 2 outdoor.quality [choice: 0 good 1 repaired 2 refused], 3 other.value [unit of the quantity], 4 other.standard_uncertainty [unit of the
/// quantity], 5 other.quality [choice: 0 good 1 repaired 2 refused], 6 other_is [choice: 0 total 1 recirculated], 7 acceptable [1]; gives
/// 0 fraction [1], 1 standard_uncertainty [1], 2 fraction_status [choice, 0 determined, 1 uncertain, 2 below zero, 3 above one, 4
/// indeterminate], 3 quality [choice, 0 good, 1 repaired, 2 refused].
pub const MOISTAIR_PROCESS_MIXING_OUTDOOR_AIR_FROM_FLOWS: i32 = 512;

/// mixing.outdoor_air_for_temperature. Takes 0–2 outdoor (state), 3–5 returned (state), 6 wanted_temperature [°C], 7 least [1], 8 most [1];
/// gives 0 fraction [1], 1–3 mixed.leaving.air.air (state), 4 mixed.leaving.air.liquid [kg/kg], 5 mixed.leaving.air.ice [kg/kg],
/// 6 mixed.leaving.air.total_water [kg/kg], 7 mixed.leaving.air.specific_enthalpy [J/kg], 8 mixed.leaving.air.is_wet [flag],
/// 9 mixed.leaving.dry_air_flow [kg/s], 10 mixed.exchange.heat [W], 11 mixed.exchange.water [kg/s], 12 mixed.exchange.water_enthalpy_flow
/// [W], 13 reach [choice, 0 reached, 1 at the least, 2 at the most].
pub const MOISTAIR_PROCESS_MIXING_OUTDOOR_AIR_FOR_TEMPERATURE: i32 = 513;

/// mixing.with_outdoor_air. Takes 0–2 outdoor (state), 3–5 returned (state), 6 fraction [1]; gives 0–2 leaving.air.air (state),
/// 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg],
/// 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W], 10 exchange.water [kg/s],
/// 11 exchange.water_enthalpy_flow [W].
pub const MOISTAIR_PROCESS_MIXING_WITH_OUTDOOR_AIR: i32 = 514;

/// humidify.saturated_steam_enthalpy. Takes 0 steam_temperature [°C]; gives 0 specific_enthalpy [J/kg].
pub const MOISTAIR_PROCESS_HUMIDIFY_SATURATED_STEAM_ENTHALPY: i32 = 600;

/// humidify.steam. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 steam_flow [kg/s], 5 steam_enthalpy [J/kg]; gives
/// 0–2 leaving.air.air (state), 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg],
/// 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W],
/// 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W], 12 evaporated [kg/s], 13 carried [kg/s].
pub const MOISTAIR_PROCESS_HUMIDIFY_STEAM: i32 = 601;

/// humidify.steam_to_humidity_ratio. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 humidity_ratio [kg/kg],
/// 5 steam_enthalpy [J/kg]; gives 0–2 leaving.air.air (state), 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg],
/// 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s],
/// 9 exchange.heat [W], 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W], 12 evaporated [kg/s], 13 carried [kg/s].
pub const MOISTAIR_PROCESS_HUMIDIFY_STEAM_TO_HUMIDITY_RATIO: i32 = 602;

/// humidify.steam_to_relative_humidity. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 relative_humidity [1],
/// 5 steam_enthalpy [J/kg]; gives 0–2 leaving.air.air (state), 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg],
/// 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s],
/// 9 exchange.heat [W], 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W], 12 evaporated [kg/s], 13 carried [kg/s].
pub const MOISTAIR_PROCESS_HUMIDIFY_STEAM_TO_RELATIVE_HUMIDITY: i32 = 603;

/// humidify.steam_limit. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 steam_enthalpy [J/kg]; gives 0 steam_flow
/// [kg/s].
pub const MOISTAIR_PROCESS_HUMIDIFY_STEAM_LIMIT: i32 = 604;

/// humidify.spray. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 water_temperature [°C]; gives
/// 0–2 leaving.air.air (state), 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg],
/// 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W],
/// 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W], 12 evaporated [kg/s], 13 carried [kg/s].
pub const MOISTAIR_PROCESS_HUMIDIFY_SPRAY: i32 = 605;

/// humidify.evaporative. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 saturation_effectiveness [1],
/// 5 water_temperature [choice: 0 wet bulb, 2 given], 6 water_temperature.given [°C]; gives 0–2 leaving.air.air (state),
/// 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg],
/// 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W], 10 exchange.water [kg/s],
/// 11 exchange.water_enthalpy_flow [W], 12 evaporated [kg/s], 13 carried [kg/s].
pub const MOISTAIR_PROCESS_HUMIDIFY_EVAPORATIVE: i32 = 606;

/// humidify.steam_absorption. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 steam_enthalpy [J/kg]; gives 0 up_to
/// [kg/s], 1 unsaturated_from [kg/s].
pub const MOISTAIR_PROCESS_HUMIDIFY_STEAM_ABSORPTION: i32 = 607;

/// humidify.saturated_steam. Takes 0 steam_pressure [Pa]; gives 0 specific_enthalpy [J/kg].
pub const MOISTAIR_PROCESS_HUMIDIFY_SATURATED_STEAM: i32 = 608;

/// humidify.wet_steam. Takes 0 steam_pressure [Pa], 1 quality [1]; gives 0 specific_enthalpy [J/kg].
pub const MOISTAIR_PROCESS_HUMIDIFY_WET_STEAM: i32 = 609;

/// humidify.superheated_steam. Takes 0 steam_temperature [°C], 1 steam_pressure [Pa]; gives 0 specific_enthalpy [J/kg].
pub const MOISTAIR_PROCESS_HUMIDIFY_SUPERHEATED_STEAM: i32 = 610;

/// humidify.throttled_steam. Takes 0 steam_enthalpy [J/kg], 1 pressure [Pa]; gives 0 temperature [°C], 1 superheat [K], 2 quality [1],
/// 3 condition [choice, 0 superheated, 1 wet].
pub const MOISTAIR_PROCESS_HUMIDIFY_THROTTLED_STEAM: i32 = 611;

/// humidify.wash. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 water_temperature [°C],
/// 6 effectiveness [1], 7 pump_heat [W], 8 carry_over_fraction [1]; gives 0–2 air.leaving.air.air (state), 3 air.leaving.air.liquid
/// [kg/kg], 4 air.leaving.air.ice [kg/kg], 5 air.leaving.air.total_water [kg/kg], 6 air.leaving.air.specific_enthalpy [J/kg],
/// 7 air.leaving.air.is_wet [flag], 8 air.leaving.dry_air_flow [kg/s], 9 air.exchange.heat [W], 10 air.exchange.water [kg/s],
/// 11 air.exchange.water_enthalpy_flow [W], 12 air.evaporated [kg/s], 13 air.carried [kg/s], 14 leaving_water [kg/s],
/// 15 leaving_water_temperature [°C], 16 heat_to_water [W], 17 moistening [choice, 0 humidifies, 1 dehumidifies].
pub const MOISTAIR_PROCESS_HUMIDIFY_WASH: i32 = 612;

/// tower.water_use. Takes 0 evaporation [kg/s], 1 circulating_flow [kg/s], 2 drift_fraction [1], 3 cycles_of_concentration [1]; gives
/// 0 evaporation [kg/s], 1 drift [kg/s], 2 blowdown [kg/s], 3 make_up [kg/s], 4 limited_by_drift [flag].
pub const MOISTAIR_PROCESS_TOWER_WATER_USE: i32 = 700;

/// tower.with_air_flow. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C], 6 cold_water
/// [°C], 7 drift_fraction [1], 8 cycles_of_concentration [1]; gives 0–2 leaving.air (state), 3 leaving.dry_air_flow [kg/s],
/// 4 leaving.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s], 7 exchange.water_enthalpy_flow [W], 8 heat_rejected [W],
/// 9 water.evaporation [kg/s], 10 water.drift [kg/s], 11 water.blowdown [kg/s], 12 water.make_up [kg/s], 13 water.limited_by_drift [flag],
/// 14 range [K], 15 approach [K], 16 effectiveness [1].
pub const MOISTAIR_PROCESS_TOWER_WITH_AIR_FLOW: i32 = 701;

/// tower.with_leaving_air. Takes 0–2 entering (state), 3–5 leaving (state), 6 water_flow [kg/s], 7 hot_water [°C], 8 cold_water [°C],
/// 9 drift_fraction [1], 10 cycles_of_concentration [1]; gives 0–2 leaving.air (state), 3 leaving.dry_air_flow [kg/s],
/// 4 leaving.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s], 7 exchange.water_enthalpy_flow [W], 8 heat_rejected [W],
/// 9 water.evaporation [kg/s], 10 water.drift [kg/s], 11 water.blowdown [kg/s], 12 water.make_up [kg/s], 13 water.limited_by_drift [flag],
/// 14 range [K], 15 approach [K], 16 effectiveness [1].
pub const MOISTAIR_PROCESS_TOWER_WITH_LEAVING_AIR: i32 = 702;

/// tower.water_to_air_ratio. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s]; gives 0 water_to_air [1].
pub const MOISTAIR_PROCESS_TOWER_WATER_TO_AIR_RATIO: i32 = 703;

/// tower.coldest_water. Takes 0–2 air (state); gives 0 water_temperature [°C].
pub const MOISTAIR_PROCESS_TOWER_COLDEST_WATER: i32 = 704;

/// tower.merkel_pinch. Takes 0–2 air (state), 3 hot_water [°C], 4 cold_water [°C]; gives 0 water_to_air [1], 1 temperature [°C].
pub const MOISTAIR_PROCESS_TOWER_MERKEL_PINCH: i32 = 705;

/// tower.merkel_number. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C], 6 cold_water
/// [°C], 7 quadrature [choice: 0 Gauss-Legendre 1 Gauss-Legendre graded 2 four points]; gives 0 number [1], 1 water_to_air [1],
/// 2 pinch.water_to_air [1], 3 pinch.temperature [°C], 4 heat_rejected [W], 5 leaving_enthalpy [J/kg].
pub const MOISTAIR_PROCESS_TOWER_MERKEL_NUMBER: i32 = 706;

/// tower.merkel_rate. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C], 6 number [1];
/// gives 0 cold_water [°C], 1 heat_rejected [W], 2 leaving_enthalpy [J/kg], 3 water_to_air [1], 4 range [K], 5 approach [K],
/// 6 effectiveness [1], 7 direction [choice, 0 cooling, 1 reversed].
pub const MOISTAIR_PROCESS_TOWER_MERKEL_RATE: i32 = 707;

/// tower.air_for_duty. Takes 0–2 air (state), 3 water_flow [kg/s], 4 hot_water [°C], 5 cold_water [°C], 6 coefficient [1], 7 exponent [1];
/// gives 0–2 air (state), 3 dry_air_flow [kg/s], 4 volume_flow [m³/s].
pub const MOISTAIR_PROCESS_TOWER_AIR_FOR_DUTY: i32 = 708;

/// tower.effectiveness_number. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C],
/// 6 cold_water [°C]; gives 0 number [1].
pub const MOISTAIR_PROCESS_TOWER_EFFECTIVENESS_NUMBER: i32 = 709;

/// tower.effectiveness_rate. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C],
/// 6 number [1]; gives 0 cold_water [°C], 1 heat_rejected [W], 2 leaving_enthalpy [J/kg], 3 water_to_air [1], 4 range [K], 5 approach [K],
/// 6 effectiveness [1], 7 direction [choice, 0 cooling, 1 reversed].
pub const MOISTAIR_PROCESS_TOWER_EFFECTIVENESS_RATE: i32 = 710;

/// tower.poppe_number. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C], 6 cold_water
/// [°C], 7 transfer [choice: 0 Bosnjakovic 1 Lewis factor one 2 evaporation suppressed]; gives 0 number [1].
pub const MOISTAIR_PROCESS_TOWER_POPPE_NUMBER: i32 = 711;

/// tower.poppe_rate. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C], 6 number [1],
/// 7 transfer [choice: 0 Bosnjakovic 1 Lewis factor one 2 evaporation suppressed]; gives 0–2 leaving.air.air (state), 3 leaving.air.liquid
/// [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet
/// [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W], 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W], 12 cold_water
/// [°C], 13 evaporation [kg/s], 14 heat_rejected [W], 15 water_to_air [1], 16 range [K], 17 approach [K], 18 effectiveness [1],
/// 19 direction [choice, 0 cooling, 1 reversed], 20 is_fogged [flag].
pub const MOISTAIR_PROCESS_TOWER_POPPE_RATE: i32 = 712;

/// tower.fill_from_two_tests. Takes 0 first_water_to_air [1], 1 first_number [1], 2 second_water_to_air [1], 3 second_number [1]; gives
/// 0 coefficient [1], 1 exponent [1].
pub const MOISTAIR_PROCESS_TOWER_FILL_FROM_TWO_TESTS: i32 = 713;

/// tower.fill_number. Takes 0 coefficient [1], 1 exponent [1], 2 water_to_air [1]; gives 0 number [1].
pub const MOISTAIR_PROCESS_TOWER_FILL_NUMBER: i32 = 714;

/// tower.fill_height. Takes 0 coefficient [1], 1 exponent [1], 2 number [1], 3 water_to_air [1], 4 tested_height [m]; gives 0 height [m].
pub const MOISTAIR_PROCESS_TOWER_FILL_HEIGHT: i32 = 715;

/// tower.cycles_of_concentration. Takes 0 circulating [mg/kg], 1 make_up [mg/kg]; gives 0 cycles [1].
pub const MOISTAIR_PROCESS_TOWER_CYCLES_OF_CONCENTRATION: i32 = 716;

/// tower.evaporation_by_rule_of_thumb. Takes 0 circulating_flow [kg/s], 1 water_range [K]; gives 0 evaporation [kg/s].
pub const MOISTAIR_PROCESS_TOWER_EVAPORATION_BY_RULE_OF_THUMB: i32 = 717;

/// tower.basin_after. Takes 0 concentration [mg/kg], 1 inventory [kg], 2 duration [s], 3 blowdown [kg/s], 4 drift [kg/s], 5 make_up_flow
/// [kg/s], 6 make_up_concentration [mg/kg]; gives 0 concentration [mg/kg].
pub const MOISTAIR_PROCESS_TOWER_BASIN_AFTER: i32 = 718;

/// compression.to_pressure. Takes 0–2 entering.air.air (state), 3 entering.air.liquid [kg/kg], 4 entering.air.ice [kg/kg],
/// 5 entering.dry_air_flow [kg/s], 6 pressure [Pa], 7 leaving_temperature [°C]; gives 0–2 leaving.air.air (state), 3 leaving.air.liquid
/// [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet
/// [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W], 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W], 12 condensate
/// [kg/s].
pub const MOISTAIR_PROCESS_COMPRESSION_TO_PRESSURE: i32 = 800;

/// books.balance. Takes 0 exchange.heat [W], 1 exchange.water [kg/s], 2 exchange.water_enthalpy_flow [W], 3–5 leaving.air.air (state),
/// 6 leaving.air.liquid [kg/kg], 7 leaving.air.ice [kg/kg], 8 leaving.dry_air_flow [kg/s], any number of times: 9–11 entering.air.air
/// (state), 12 entering.air.liquid [kg/kg], 13 entering.air.ice [kg/kg], 14 entering.dry_air_flow [kg/s]; gives 0 heat_residual [W],
/// 1 heat_scale [W], 2 water_residual [kg/s], 3 water_scale [kg/s], 4 heat_resolution [W], 5 close [flag].
pub const MOISTAIR_PROCESS_BOOKS_BALANCE: i32 = 900;

/// reheat.to_state. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4–6 target (state), 7 coil_leaving_relative_humidity
/// [1], 8 condensate_temperature [choice: 0 leaving air, 1 apparatus, 2 given], 9 condensate_temperature.given [°C]; gives
/// 0–2 cooling.entering.air (state), 3 cooling.entering.dry_air_flow [kg/s], 4 cooling.entering.volume_flow [m³/s], 5–7 cooling.leaving.air
/// (state), 8 cooling.leaving.dry_air_flow [kg/s], 9 cooling.leaving.volume_flow [m³/s], 10 cooling.exchange.heat [W],
/// 11 cooling.exchange.water [kg/s], 12 cooling.exchange.water_enthalpy_flow [W], 13 cooling.cooling_load [W], 14 cooling.sensible [W],
/// 15 cooling.latent [W], 16 cooling.condensate [kg/s], 17 cooling.regime [choice, 0 dry, 1 wet, 2 frost, 3 partly wet],
/// 18 cooling.sensible_heat_ratio [1], 19–21 heating.leaving.air (state), 22 heating.leaving.dry_air_flow [kg/s],
/// 23 heating.leaving.volume_flow [m³/s], 24 heating.exchange.heat [W], 25 heating.exchange.water [kg/s],
/// 26 heating.exchange.water_enthalpy_flow [W], 27 reheat [W], 28 reheat_fraction [1].
pub const MOISTAIR_PROCESS_REHEAT_TO_STATE: i32 = 1000;

/// reheat.with_coil. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4–6 target (state), 7 coil_leaving [choice: 0 relative
/// humidity, 1 bypass], 8 coil_leaving.fraction [1], 9 coil_leaving.coldest [°C], 10 condensate_temperature [choice: 0 leaving air, 1
/// apparatus, 2 given], 11 condensate_temperature.given [°C]; gives 0–2 cooling.entering.air (state), 3 cooling.entering.dry_air_flow
/// [kg/s], 4 cooling.entering.volume_flow [m³/s], 5–7 cooling.leaving.air (state), 8 cooling.leaving.dry_air_flow [kg/s],
/// 9 cooling.leaving.volume_flow [m³/s], 10 cooling.exchange.heat [W], 11 cooling.exchange.water [kg/s],
/// 12 cooling.exchange.water_enthalpy_flow [W], 13 cooling.cooling_load [W], 14 cooling.sensible [W], 15 cooling.latent [W],
/// 16 cooling.condensate [kg/s], 17 cooling.regime [choice, 0 dry, 1 wet, 2 frost, 3 partly wet], 18 cooling.sensible_heat_ratio [1],
/// 19–21 heating.leaving.air (state), 22 heating.leaving.dry_air_flow [kg/s], 23 heating.leaving.volume_flow [m³/s],
/// 24 heating.exchange.heat [W], 25 heating.exchange.water [kg/s], 26 heating.exchange.water_enthalpy_flow [W], 27 reheat [W],
/// 28 reheat_fraction [1].
pub const MOISTAIR_PROCESS_REHEAT_WITH_COIL: i32 = 1001;

/// room.supply_at_temperature. Takes 0–2 room (state), 3 gains.sensible [W], 4 gains.moisture [kg/s], 5 gains.moisture_source [choice: 0
/// saturated vapor, 1 liquid, 2 enthalpy], 6 gains.moisture_source.value [°C or J/kg], 7 supply_temperature [°C]; gives 0–2 supply.air
/// (state), 3 supply.dry_air_flow [kg/s], 4 supply.volume_flow [m³/s], 5–7 room.air.air (state), 8 room.air.liquid [kg/kg], 9 room.air.ice
/// [kg/kg], 10 room.air.total_water [kg/kg], 11 room.air.specific_enthalpy [J/kg], 12 room.air.is_wet [flag], 13 room.dry_air_flow [kg/s],
/// 14 exchange.heat [W], 15 exchange.water [kg/s], 16 exchange.water_enthalpy_flow [W].
pub const MOISTAIR_PROCESS_ROOM_SUPPLY_AT_TEMPERATURE: i32 = 1500;

/// room.supply_at_flow. Takes 0–2 room (state), 3 gains.sensible [W], 4 gains.moisture [kg/s], 5 gains.moisture_source [choice: 0 saturated
/// vapor, 1 liquid, 2 enthalpy], 6 gains.moisture_source.value [°C or J/kg], 7 dry_air_flow [kg/s]; gives 0–2 supply.air (state),
/// 3 supply.dry_air_flow [kg/s], 4 supply.volume_flow [m³/s], 5–7 room.air.air (state), 8 room.air.liquid [kg/kg], 9 room.air.ice [kg/kg],
/// 10 room.air.total_water [kg/kg], 11 room.air.specific_enthalpy [J/kg], 12 room.air.is_wet [flag], 13 room.dry_air_flow [kg/s],
/// 14 exchange.heat [W], 15 exchange.water [kg/s], 16 exchange.water_enthalpy_flow [W].
pub const MOISTAIR_PROCESS_ROOM_SUPPLY_AT_FLOW: i32 = 1501;

/// room.room_of_supply. Takes 0–2 supply.air (state), 3 supply.dry_air_flow [kg/s], 4 gains.sensible [W], 5 gains.moisture [kg/s],
/// 6 gains.moisture_source [choice: 0 saturated vapor, 1 liquid, 2 enthalpy], 7 gains.moisture_source.value [°C or J/kg]; gives
/// 0–2 supply.air (state), 3 supply.dry_air_flow [kg/s], 4 supply.volume_flow [m³/s], 5–7 room.air.air (state), 8 room.air.liquid [kg/kg],
/// 9 room.air.ice [kg/kg], 10 room.air.total_water [kg/kg], 11 room.air.specific_enthalpy [J/kg], 12 room.air.is_wet [flag],
/// 13 room.dry_air_flow [kg/s], 14 exchange.heat [W], 15 exchange.water [kg/s], 16 exchange.water_enthalpy_flow [W].
pub const MOISTAIR_PROCESS_ROOM_ROOM_OF_SUPPLY: i32 = 1502;

/// room.gains_between. Takes 0–2 supply.air (state), 3 supply.dry_air_flow [kg/s], 4–6 room (state), 7 moisture_source [choice: 0 saturated
/// vapor, 1 liquid, 2 enthalpy], 8 moisture_source.value [°C or J/kg]; gives 0 sensible [W], 1 moisture [kg/s].
pub const MOISTAIR_PROCESS_ROOM_GAINS_BETWEEN: i32 = 1503;

/// room.latent_heat. Takes 0–2 room (state); gives 0 latent_heat [J/kg].
pub const MOISTAIR_PROCESS_ROOM_LATENT_HEAT: i32 = 1504;

/// room.sensible_heat_ratio. Takes 0–2 room (state), 3 gains.sensible [W], 4 gains.moisture [kg/s], 5 gains.moisture_source [choice: 0
/// saturated vapor, 1 liquid, 2 enthalpy], 6 gains.moisture_source.value [°C or J/kg]; gives 0 sensible_heat_ratio [1].
pub const MOISTAIR_PROCESS_ROOM_SENSIBLE_HEAT_RATIO: i32 = 1505;

/// room.process_slope. Takes 0 gains.sensible [W], 1 gains.moisture [kg/s], 2 gains.moisture_source [choice: 0 saturated vapor, 1 liquid, 2
/// enthalpy], 3 gains.moisture_source.value [°C or J/kg], 4 pressure [Pa]; gives 0 slope [J/kg].
pub const MOISTAIR_PROCESS_ROOM_PROCESS_SLOPE: i32 = 1506;

/// room.slope_of_ratio. Takes 0–2 room (state), 3 sensible_heat_ratio [1]; gives 0 slope [J/kg].
pub const MOISTAIR_PROCESS_ROOM_SLOPE_OF_RATIO: i32 = 1507;

/// room.ratio_of_slope. Takes 0–2 room (state), 3 slope [J/kg]; gives 0 sensible_heat_ratio [1].
pub const MOISTAIR_PROCESS_ROOM_RATIO_OF_SLOPE: i32 = 1508;

/// room.apparatus_dew_points. Takes 0–2 room (state), 3 sensible_heat_ratio [1]; gives 0 warmer [°C], 1 colder [°C].
pub const MOISTAIR_PROCESS_ROOM_APPARATUS_DEW_POINTS: i32 = 1509;

/// room.limiting_line. Takes 0–2 room (state), 3–5 entering (state), 6 coil_leaving [choice: 0 relative humidity, 1 bypass],
/// 7 coil_leaving.fraction [1], 8 coil_leaving.coldest [°C]; gives 0 sensible_heat_ratio [1], 1 slope [J/kg], 2 touches [°C], 3 at_coldest
/// [flag].
pub const MOISTAIR_PROCESS_ROOM_LIMITING_LINE: i32 = 1510;

/// room.least_reheat. Takes 0–2 room (state), 3 gains.sensible [W], 4 gains.moisture [kg/s], 5 gains.moisture_source [choice: 0 saturated
/// vapor, 1 liquid, 2 enthalpy], 6 gains.moisture_source.value [°C or J/kg], 7–9 entering (state), 10 coil_leaving [choice: 0 relative
/// humidity, 1 bypass], 11 coil_leaving.fraction [1], 12 coil_leaving.coldest [°C]; gives 0 reheat [W], 1 cause [choice, 0 not needed, 1
/// line misses the coil, 2 coldest of the coil], 2–4 supply.air (state), 5 supply.dry_air_flow [kg/s], 6 supply.volume_flow [m³/s],
/// 7–9 coil_leaving (state), 10 limit.sensible_heat_ratio [1], 11 limit.slope [J/kg], 12 limit.touches [°C], 13 limit.at_coldest [flag].
pub const MOISTAIR_PROCESS_ROOM_LEAST_REHEAT: i32 = 1511;

/// room.conditioned. Takes 0–2 room (state), 3 gains.sensible [W], 4 gains.moisture [kg/s], 5 gains.moisture_source [choice: 0 saturated
/// vapor, 1 liquid, 2 enthalpy], 6 gains.moisture_source.value [°C or J/kg], 7–9 entering.air (state), 10 entering.dry_air_flow [kg/s],
/// 11 coil_leaving [choice: 0 relative humidity, 1 bypass], 12 coil_leaving.fraction [1], 13 coil_leaving.coldest [°C],
/// 14 condensate_temperature [choice: 0 leaving air, 1 apparatus, 2 given], 15 condensate_temperature.given [°C]; gives 0–2 room.supply.air
/// (state), 3 room.supply.dry_air_flow [kg/s], 4 room.supply.volume_flow [m³/s], 5–7 room.room.air.air (state), 8 room.room.air.liquid
/// [kg/kg], 9 room.room.air.ice [kg/kg], 10 room.room.air.total_water [kg/kg], 11 room.room.air.specific_enthalpy [J/kg],
/// 12 room.room.air.is_wet [flag], 13 room.room.dry_air_flow [kg/s], 14 room.exchange.heat [W], 15 room.exchange.water [kg/s],
/// 16 room.exchange.water_enthalpy_flow [W], 17–19 reheat.cooling.entering.air (state), 20 reheat.cooling.entering.dry_air_flow [kg/s],
/// 21 reheat.cooling.entering.volume_flow [m³/s], 22–24 reheat.cooling.leaving.air (state), 25 reheat.cooling.leaving.dry_air_flow [kg/s],
/// 26 reheat.cooling.leaving.volume_flow [m³/s], 27 reheat.cooling.exchange.heat [W], 28 reheat.cooling.exchange.water [kg/s],
/// 29 reheat.cooling.exchange.water_enthalpy_flow [W], 30 reheat.cooling.cooling_load [W], 31 reheat.cooling.sensible [W],
/// 32 reheat.cooling.latent [W], 33 reheat.cooling.condensate [kg/s], 34 reheat.cooling.regime [choice, 0 dry, 1 wet, 2 frost, 3 partly
/// wet], 35 reheat.cooling.sensible_heat_ratio [1], 36–38 reheat.heating.leaving.air (state), 39 reheat.heating.leaving.dry_air_flow
/// [kg/s], 40 reheat.heating.leaving.volume_flow [m³/s], 41 reheat.heating.exchange.heat [W], 42 reheat.heating.exchange.water [kg/s],
/// 43 reheat.heating.exchange.water_enthalpy_flow [W], 44 reheat.reheat [W], 45 reheat.reheat_fraction [1].
pub const MOISTAIR_PROCESS_ROOM_CONDITIONED: i32 = 1512;

/// desiccant.to_humidity_ratio. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 target [kg/kg], 5 sorption_heat_ratio
/// [1], 6 carry_over [choice: 0 none, 1 heat, 2 rise], 7 carry_over.value [W or K]; gives 0–2 leaving.air (state), 3 leaving.dry_air_flow
/// [kg/s], 4 leaving.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s], 7 exchange.water_enthalpy_flow [W], 8 removed
/// [kg/s], 9 sorption_heat [W], 10 carried_heat [W].
pub const MOISTAIR_PROCESS_DESICCANT_TO_HUMIDITY_RATIO: i32 = 1600;

/// desiccant.by_effectiveness. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 effectiveness [1], 5 driest [kg/kg],
/// 6 sorption_heat_ratio [1], 7 carry_over [choice: 0 none, 1 heat, 2 rise], 8 carry_over.value [W or K]; gives 0–2 leaving.air (state),
/// 3 leaving.dry_air_flow [kg/s], 4 leaving.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s],
/// 7 exchange.water_enthalpy_flow [W], 8 removed [kg/s], 9 sorption_heat [W], 10 carried_heat [W].
pub const MOISTAIR_PROCESS_DESICCANT_BY_EFFECTIVENESS: i32 = 1601;

/// desiccant.wheel. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 target [kg/kg], 5 sorption_heat_ratio [1],
/// 6 carry_over [choice: 0 none, 1 heat, 2 rise], 7 carry_over.value [W or K], 8–10 regeneration.air (state), 11 regeneration.dry_air_flow
/// [kg/s], 12 heater [choice: 0 heat, 1 entering temperature, 2 leaving temperature], 13 heater.value [W or °C]; gives
/// 0–2 process.leaving.air (state), 3 process.leaving.dry_air_flow [kg/s], 4 process.leaving.volume_flow [m³/s], 5 process.exchange.heat
/// [W], 6 process.exchange.water [kg/s], 7 process.exchange.water_enthalpy_flow [W], 8 process.removed [kg/s], 9 process.sorption_heat [W],
/// 10 process.carried_heat [W], 11–13 heater.leaving.air (state), 14 heater.leaving.dry_air_flow [kg/s], 15 heater.leaving.volume_flow
/// [m³/s], 16 heater.exchange.heat [W], 17 heater.exchange.water [kg/s], 18 heater.exchange.water_enthalpy_flow [W], 19–21 regeneration.air
/// (state), 22 regeneration.dry_air_flow [kg/s], 23 regeneration.volume_flow [m³/s], 24 regeneration_exchange.heat [W],
/// 25 regeneration_exchange.water [kg/s], 26 regeneration_exchange.water_enthalpy_flow [W], 27 regeneration_heat [W], 28 heat_per_water
/// [J/kg], 29 entropy_production [1], 30 wheel [choice, 0 possible, 1 against the second law].
pub const MOISTAIR_PROCESS_DESICCANT_WHEEL: i32 = 1602;

/// desiccant.potentials. Takes 0–2 air (state); gives 0 first [1], 1 second [1].
pub const MOISTAIR_PROCESS_DESICCANT_POTENTIALS: i32 = 1603;

/// desiccant.wheel_by_potentials. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4–6 regeneration.air (state),
/// 7 regeneration.dry_air_flow [kg/s], 8 first_effectiveness [1], 9 second_effectiveness [1]; gives 0–2 process.air (state),
/// 3 process.dry_air_flow [kg/s], 4 process.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s],
/// 7 exchange.water_enthalpy_flow [W], 8–10 regeneration.air (state), 11 regeneration.dry_air_flow [kg/s], 12 regeneration.volume_flow
/// [m³/s], 13 regeneration_exchange.heat [W], 14 regeneration_exchange.water [kg/s], 15 regeneration_exchange.water_enthalpy_flow [W],
/// 16 removed [kg/s], 17 imbalance.heat [W], 18 imbalance.water [kg/s], 19 entropy_production [1], 20 wheel [choice, 0 possible, 1 against
/// the second law], 21 correlation [choice, 0 within, 1 off standard pressure].
pub const MOISTAIR_PROCESS_DESICCANT_WHEEL_BY_POTENTIALS: i32 = 1604;

/// desiccant.effectiveness_between. Takes 0–2 air (state), 3–5 dried (state), 6–8 regeneration (state); gives 0 first [1], 1 second [1].
pub const MOISTAIR_PROCESS_DESICCANT_EFFECTIVENESS_BETWEEN: i32 = 1605;

/// evaporative.direct. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 saturation_effectiveness [1], 5 circulating_flow
/// [kg/s], 6 pump_heat [W], 7 make_up_temperature [choice: 0 wet bulb, 2 given], 8 make_up_temperature.given [°C], 9 drift_fraction [1],
/// 10 cycles_of_concentration [1]; gives 0–2 air.leaving.air.air (state), 3 air.leaving.air.liquid [kg/kg], 4 air.leaving.air.ice [kg/kg],
/// 5 air.leaving.air.total_water [kg/kg], 6 air.leaving.air.specific_enthalpy [J/kg], 7 air.leaving.air.is_wet [flag],
/// 8 air.leaving.dry_air_flow [kg/s], 9 air.exchange.heat [W], 10 air.exchange.water [kg/s], 11 air.exchange.water_enthalpy_flow [W],
/// 12 air.evaporated [kg/s], 13 air.carried [kg/s], 14 water_temperature [°C], 15 water.evaporation [kg/s], 16 water.drift [kg/s],
/// 17 water.blowdown [kg/s], 18 water.make_up [kg/s], 19 water.limited_by_drift [flag], 20 condition [choice, 0 evaporating, 1 already
/// saturated].
pub const MOISTAIR_PROCESS_EVAPORATIVE_DIRECT: i32 = 1700;

/// evaporative.indirect. Takes 0–2 primary.air (state), 3 primary.dry_air_flow [kg/s], 4–6 secondary.air (state), 7 secondary.dry_air_flow
/// [kg/s], 8 effectiveness_of [choice: 0 wet bulb, 1 dew point], 9 effectiveness [1], 10 exhaust_humidity [1], 11 pump_heat [W],
/// 12 water_temperature [choice: 0 wet bulb, 2 given], 13 water_temperature.given [°C]; gives 0–2 primary.air (state),
/// 3 primary.dry_air_flow [kg/s], 4 primary.volume_flow [m³/s], 5 primary_exchange.heat [W], 6 primary_exchange.water [kg/s],
/// 7 primary_exchange.water_enthalpy_flow [W], 8–10 secondary.leaving.air.air (state), 11 secondary.leaving.air.liquid [kg/kg],
/// 12 secondary.leaving.air.ice [kg/kg], 13 secondary.leaving.air.total_water [kg/kg], 14 secondary.leaving.air.specific_enthalpy [J/kg],
/// 15 secondary.leaving.air.is_wet [flag], 16 secondary.leaving.dry_air_flow [kg/s], 17 secondary.exchange.heat [W],
/// 18 secondary.exchange.water [kg/s], 19 secondary.exchange.water_enthalpy_flow [W], 20 secondary.evaporated [kg/s], 21 secondary.carried
/// [kg/s], 22 heat [W], 23 condensate [kg/s], 24 condition [choice, 0 cooling, 1 no drive, 2 condensing, 3 frosting].
pub const MOISTAIR_PROCESS_EVAPORATIVE_INDIRECT: i32 = 1701;

/// evaporative.two_stage. Takes 0–2 primary.air (state), 3 primary.dry_air_flow [kg/s], 4–6 secondary.air (state), 7 secondary.dry_air_flow
/// [kg/s], 8 effectiveness_of [choice: 0 wet bulb, 1 dew point], 9 effectiveness [1], 10 exhaust_humidity [1], 11 indirect_pump_heat [W],
/// 12 water_temperature [choice: 0 wet bulb, 2 given], 13 water_temperature.given [°C], 14 saturation_effectiveness [1],
/// 15 circulating_flow [kg/s], 16 pump_heat [W], 17 make_up_temperature [choice: 0 wet bulb, 2 given], 18 make_up_temperature.given [°C],
/// 19 drift_fraction [1], 20 cycles_of_concentration [1]; gives 0–2 indirect.primary.air (state), 3 indirect.primary.dry_air_flow [kg/s],
/// 4 indirect.primary.volume_flow [m³/s], 5 indirect.primary_exchange.heat [W], 6 indirect.primary_exchange.water [kg/s],
/// 7 indirect.primary_exchange.water_enthalpy_flow [W], 8–10 indirect.secondary.leaving.air.air (state),
/// 11 indirect.secondary.leaving.air.liquid [kg/kg], 12 indirect.secondary.leaving.air.ice [kg/kg],
/// 13 indirect.secondary.leaving.air.total_water [kg/kg], 14 indirect.secondary.leaving.air.specific_enthalpy [J/kg],
/// 15 indirect.secondary.leaving.air.is_wet [flag], 16 indirect.secondary.leaving.dry_air_flow [kg/s], 17 indirect.secondary.exchange.heat
/// [W], 18 indirect.secondary.exchange.water [kg/s], 19 indirect.secondary.exchange.water_enthalpy_flow [W],
/// 20 indirect.secondary.evaporated [kg/s], 21 indirect.secondary.carried [kg/s], 22 indirect.heat [W], 23 indirect.condensate [kg/s],
/// 24 indirect.condition [choice, 0 cooling, 1 no drive, 2 condensing, 3 frosting], 25–27 direct.air.leaving.air.air (state),
/// 28 direct.air.leaving.air.liquid [kg/kg], 29 direct.air.leaving.air.ice [kg/kg], 30 direct.air.leaving.air.total_water [kg/kg],
/// 31 direct.air.leaving.air.specific_enthalpy [J/kg], 32 direct.air.leaving.air.is_wet [flag], 33 direct.air.leaving.dry_air_flow [kg/s],
/// 34 direct.air.exchange.heat [W], 35 direct.air.exchange.water [kg/s], 36 direct.air.exchange.water_enthalpy_flow [W],
/// 37 direct.air.evaporated [kg/s], 38 direct.air.carried [kg/s], 39 direct.water_temperature [°C], 40 direct.water.evaporation [kg/s],
/// 41 direct.water.drift [kg/s], 42 direct.water.blowdown [kg/s], 43 direct.water.make_up [kg/s], 44 direct.water.limited_by_drift [flag],
/// 45 direct.condition [choice, 0 evaporating, 1 already saturated], 46 evaporated [kg/s].
pub const MOISTAIR_PROCESS_EVAPORATIVE_TWO_STAGE: i32 = 1702;

/// economizer.coil_load. Takes 0–2 air (state), 3 supply_temperature [°C], 4 coil_leaving_humidity [1]; gives 0 heat [J/kg], 1 wet [flag].
pub const MOISTAIR_PROCESS_ECONOMIZER_COIL_LOAD: i32 = 1900;

/// economizer.enthalpy_limit. Takes 0 pressure [Pa]; gives 0 enthalpy_limit [J/kg].
pub const MOISTAIR_PROCESS_ECONOMIZER_ENTHALPY_LIMIT: i32 = 1901;

/// economizer.outdoor_air. Takes 0 enabled [choice: 0 no 1 yes], 1–3 outdoor (state), 4–6 returned (state), 7 wanted_temperature [°C],
/// 8 least [1], 9 most [1]; gives 0 fraction [1], 1–3 mixed.leaving.air.air (state), 4 mixed.leaving.air.liquid [kg/kg],
/// 5 mixed.leaving.air.ice [kg/kg], 6 mixed.leaving.air.total_water [kg/kg], 7 mixed.leaving.air.specific_enthalpy [J/kg],
/// 8 mixed.leaving.air.is_wet [flag], 9 mixed.leaving.dry_air_flow [kg/s], 10 mixed.exchange.heat [W], 11 mixed.exchange.water [kg/s],
/// 12 mixed.exchange.water_enthalpy_flow [W], 13 reach [choice, 0 reached, 1 at the least, 2 at the most].
pub const MOISTAIR_PROCESS_ECONOMIZER_OUTDOOR_AIR: i32 = 1902;
