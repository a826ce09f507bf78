/** Questions as they are typed, of every kind that the program answers: one argument list each. */
const typed = `
air fused-silica 632.8nm
air fused-silica 633nm --angle 45 --pol p
fused-silica air 633nm --angle 60
fused-silica air 633nm --angle 43.2 --pol s
air n-bk7 d-line --tolerance wave=1nm,angle=0.5deg,n=1e-4
air n-bk7 589.3nm --air-wavelength --temperature 40C
air sapphire:o 1064nm --angle 45 --pol p
air sapphire:e 5um
air sapphire 2.94um
air ktp:z 1064nm
air aluminium 550nm
air gold 10.6um --angle 70
air silver 1.55um --angle 45 --pol s
copper air 10.6um
air silicon 400nm
air germanium 10.6um --temperature 60C
air znse 10.6um --power 30W --beam 6mm
air water 10GHz
air sea-water 1MHz --salinity 35 --temperature 10C
vacuum eps=9.8,tand=0.0003 10GHz
vacuum eps=4,sigma=0.01 1MHz --angle 30
vacuum eps=2.5,mu=1.2 3GHz --angle 50 --pol s
air n=1.5 1um
air n=1.5+0.02i 500nm --angle 80
n=1.5 n=1.5 1um
air n=1 633nm
n=1 n=1 1GHz --angle 89.9
vacuum vacuum 1eV
air eps=-10+0.5i 800nm --angle 45 --pol p
n=1.7 n=0.2+3i 600nm --angle 60
water air 474THz --angle 48.75
air water 1.96eV --angle 53 --pol p
air diamond 15800cm-1
air fused-silica 4.5um --extrapolate
air bk7 200nm --extrapolate
air magnesium-fluoride-film 550nm
air polystyrene 633nm
air itu-concrete 5.8GHz --angle 60 --pol s
air stainless-steel 10GHz --power 1W --beam 10mm --profile flat
air fused-silica 1064nm --irradiance 1kW/m2 --angle 20
air fused-silica 633nm --field 100V/m
fused-silica air 633nm --angle 60 --irradiance 1W/cm2
air water 633nm --power 5mW
air ethanol 589nm --temperature 30C --tolerance temperature=0.5C
air fused-silica 193.4nm --extrapolate
air silicon 1THz
air ice 10GHz --temperature -10C
air helium 633nm --pressure 2atm --temperature 300K
air air 633nm --humidity 50%
vacuum air 633nm --humidity 100% --temperature 40C --pressure 80kPa
air magnesium-fluoride-film@qw n-bk7 550nm
air fused-silica@5mm air 800nm --pulse 30fs
air 8x: n=2.3@qw n=1.46@qw : n-bk7 633nm --field-profile
air sapphire:o@1mm air 1.55um --angle 30 --power 1W --beam 1mm
air n=1.5+0.001i@10um water 633nm --angle 20 --pol s
`;

export const QUESTIONS: readonly string[] = typed.trim().split('\n');

export const argumentsOf = (question: string): readonly string[] => question.split(' ');
