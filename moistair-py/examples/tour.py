"""A short tour: a state of moist air, what can be read from it, and a coil that cools it."""

import moistair
from moistair.process import AirStream, coil

site = moistair.pressure_at_elevation(1600.0)
outdoor = moistair.MoistAir(dry_bulb=34.0, relative_humidity=0.38, pressure=site)
print(f"wet bulb   {outdoor.wet_bulb:.2f} °C")
print(f"dew point  {outdoor.dew_point:.2f} °C")
print(f"enthalpy   {outdoor.specific_enthalpy / 1000.0:.2f} kJ/kg")

entering = AirStream.from_volume_flow(outdoor, volume_flow=5.0)
leaving = moistair.MoistAir(dry_bulb=13.0, relative_humidity=0.95, pressure=site)
cooling = coil.to_state(entering, leaving=leaving)
print(f"load       {cooling.cooling_load / 1000.0:.2f} kW")
print(f"condensate {cooling.condensate * 3600.0:.2f} kg/h")
