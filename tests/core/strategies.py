"""Bikes to test with: paths of front and rear wheels, and springs for them."""

from hypothesis import strategies as st

from core.air_spring import AirSpring, Chambers
from core.coil import Coil
from core.geometry import Fork
from core.linkage import Linkage
from core.units import BAR, DEGREE, LBF_PER_INCH

progressions = (
    st.just(0.0)
    | st.floats(-0.2, -1e-6)
    | st.floats(1e-6, 0.4)
    | st.sampled_from([1e-12, -1e-9, 1e-7])
)
shares = st.floats(0.02, 0.6)
whole_way = st.just(0.0) | st.floats(1e-9, 1.0)

forks = st.builds(Fork, st.floats(0.08, 0.2), st.floats(55 * DEGREE, 80 * DEGREE))
linkages = st.builds(Linkage.from_stroke, st.floats(0.1, 0.2), st.floats(0.05, 0.07), progressions)
paths = forks | linkages


@st.composite
def chambers_for(draw, path):
    stroke = float(path.full_stroke)
    return Chambers(
        length=stroke * draw(st.floats(1.3, 2.5)),
        negative_length=stroke * draw(st.floats(0.2, 1.5)),
        area_ratio=draw(st.floats(0.85, 1.0)),
        exponent=draw(st.floats(1.2, 1.4)),
        joined_at=stroke * draw(st.just(0.0) | st.floats(1e-6, 0.05)),
    )


@st.composite
def air_springs_for(draw, path):
    return AirSpring(
        draw(chambers_for(path)),
        pressure=draw(st.floats(3 * BAR, 20 * BAR)),
        area=draw(st.floats(5e-4, 2e-3)),
        ambient=draw(st.floats(0.7 * BAR, 1.02 * BAR)),
    )


@st.composite
def coils_for(draw, path):
    rate = draw(st.floats(200.0, 800.0)) * LBF_PER_INCH
    return Coil(rate, preload=draw(st.just(0.0) | st.floats(1e-6, 0.1)) * float(path.full_stroke))


@st.composite
def ends(draw):
    """A path and a spring on it."""
    path = draw(paths)
    return path, draw(air_springs_for(path) | coils_for(path))
