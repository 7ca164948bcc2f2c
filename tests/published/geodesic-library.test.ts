import geographicLib from 'geographiclib-geodesic'
import { describe, expect, it } from 'vitest'
import { geodesic, wgs84 } from '../support/geodesic'

describe('the reference library gives its own published values', () => {
  // geographiclib/geographiclib-js, geodesic/test/geodesictest.js: lat1, lon1, azi1, lat2, lon2, azi2, s12.
  const rows = [
    [35.60777, -139.44815, 111.09874842956033, -11.17491, -69.95921, 129.28927088970877, 8935244.56048183],
    [55.52454, 106.05087, 22.0200598809828, 77.03196, 197.18234, 109.11204111067151, 4105086.171392441],
    [-21.97856, 142.59065, -32.44456876433189, 41.84138, 98.56635, -41.84359951440466, 8394328.894657671],
    [-66.99028, 112.2363, 173.73491240878403, -12.70631, 285.90344, 2.512956620913668, 11150344.231208025],
    [-17.42761, 173.34268, -159.03355766119293, -15.84784, 5.93557, -20.78748465153699, 16076603.163118068],
    [32.84994, 48.28919, 150.492927788122, -56.28556, 202.29132, 48.11344939981676, 16727068.943816446],
    [6.96833, 52.74123, 92.58158538631771, -7.39675, 206.17291, 90.72169216592391, 17102477.249695837],
    [-50.56724, -16.30485, -105.43967990759016, -33.56571, -94.97412, -47.34854783565033, 6455670.511866869],
    [-58.93002, -8.90775, 140.96539790250068, -8.91104, 133.13503, 19.255429433416598, 11756066.021986462],
    [-68.82867, -74.28391, 93.77434776311487, -50.63005, -8.36685, 34.65564085411343, 3956936.926063544],
    [-10.62672, -32.0898, -86.42671328674776, 5.883, -134.31681, -80.47378097103487, 11470869.386456301],
    [-21.76221, 166.90563, 29.31942120693643, 48.72884, 213.97627, 43.50867194641017, 9098627.398655491],
    [-19.79938, -174.47484, 71.16727578017154, -11.99349, -154.35109, 65.58909977519923, 2319004.860116939],
    [-11.95887, -116.94513, 92.71261983045255, 4.57352, 7.16501, 78.64960934409585, 13834722.580140138],
    [-87.85331, 85.66836, -65.12031304024275, 66.48646, 16.09921, -4.888658719272296, 17286615.314714465],
    [1.74708, 128.32011, -101.58484363117385, -11.16617, 11.87109, -86.32579329643748, 12942901.124134742],
    [-25.72959, -144.90758, -153.6474686931172, -57.70581, -269.17879, -48.34398315887649, 9413446.745245311],
    [-41.22777, 122.32875, 14.285113402275739, -7.57291, 130.37946, 10.805303085187369, 3812686.035106021],
    [11.01307, 138.25278, 79.43682622782374, 6.62726, 247.05981, 103.70809021552266, 11911190.819018409],
    [-29.47124, 95.14681, -163.77913044168838, -27.46601, -69.15955, -15.90933594555497, 13487015.838114548],
  ] as const

  it.each(rows)('inverse and direct from %d, %d at azimuth %d', (lat1, lon1, azi1, lat2, lon2, azi2, s12) => {
    const inverse = wgs84.Inverse(lat1, lon1, lat2, geographicLib.Math.AngNormalize(lon2))
    expect(Math.abs(inverse.s12! - s12)).toBeLessThanOrEqual(1e-8)
    expect(Math.abs(inverse.azi1! - azi1)).toBeLessThanOrEqual(1e-13)
    expect(Math.abs(inverse.azi2! - azi2)).toBeLessThanOrEqual(1e-13)
    const direct = wgs84.Direct(
      lat1,
      lon1,
      azi1,
      s12,
      geographicLib.Geodesic.STANDARD | geographicLib.Geodesic.LONG_UNROLL,
    )
    expect(Math.abs(direct.lat2! - lat2)).toBeLessThanOrEqual(1e-13)
    expect(Math.abs(direct.lon2! - lon2)).toBeLessThanOrEqual(1e-13)
  })

  it('the worked examples of its tutorial', () => {
    // geographiclib/geographiclib-js, doc/tutorials/3-examples.md.
    expect(geodesic([174.81, -41.32], [-5.5, 40.96]).length).toBeCloseTo(19_959_679.267, 3)
    const far = wgs84.Direct(-32.06, 115.74, 225, 20_000e3)
    expect(far.lat2).toBeCloseTo(32.11195529, 8)
    expect(far.lon2).toBeCloseTo(-63.95925278, 8)
    const antarctica = wgs84.Polygon(false)
    const coast = [
      [-63.1, -58],
      [-72.9, -74],
      [-71.9, -102],
      [-74.9, -102],
      [-74.3, -131],
      [-77.5, -163],
      [-77.4, 163],
      [-71.7, 172],
      [-65.9, 140],
      [-65.7, 113],
      [-66.6, 88],
      [-66.9, 59],
      [-69.8, 25],
      [-70, -4],
      [-71, -14],
      [-77.3, -33],
      [-77.9, -46],
      [-74.7, -61],
    ] as const
    for (const [latitude, longitude] of coast) antarctica.AddPoint(latitude, longitude)
    const { perimeter, area } = antarctica.Compute(false, true)
    expect(Math.abs(perimeter - 16_831_067.893)).toBeLessThanOrEqual(0.001)
    expect(Math.abs(area! - 13_662_703_680_020.1)).toBeLessThanOrEqual(0.1)
  })

  it('New York to London, the pair of its documentation (length and azimuth computed with it)', () => {
    const { length, azimuth } = geodesic([-73.8, 40.6], [-0.5, 51.6])
    expect(Math.abs(length - 5_551_759.400319)).toBeLessThan(0.001)
    expect(azimuth).toBeCloseTo(51.1988828, 6)
  })

  it('a degree of longitude on the equator and a quarter meridian of WGS 84 (derived)', () => {
    expect(geodesic([0, 0], [1, 0]).length).toBeCloseTo(111_319.4908, 4)
    expect(geodesic([0, 0], [0, 90]).length).toBeCloseTo(10_001_965.7293, 4)
  })
})
