package hill_test

import (
	"fmt"
	"strings"

	"hillwright/physics/hill"
)

func ExampleParseSections() {
	p, err := hill.ParseSections("400 m at 7 %, 60 m at 18 %")
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("%.0f m along the road, up %.2f m\n", p.LengthM(), p.AscentM())
	fmt.Println(hill.FormatSections(&p))
	_, err = hill.ParseSections("400 m at 7")
	fmt.Println(err)
	// Output:
	// 460 m along the road, up 38.56 m
	// 400m@7%,60m@18%
	// section 1 ("400 m at 7"): expected % behind the grade, got nothing; write sections like "400m@7%,60m@18%" or "400 m at 7 %, 60 m at 18 %"
}

func ExampleReadTrack() {
	var gpx strings.Builder
	gpx.WriteString("<gpx><trk><name>Mill lane</name><trkseg>")
	for i := range 31 {
		fmt.Fprintf(&gpx, `<trkpt lat="%.5f" lon="8"><ele>%.1f</ele></trkpt>`, 47+float64(i)*1e-4, 400+float64(i))
	}
	gpx.WriteString("</trkseg></trk></gpx>")
	track, err := hill.ReadTrack(strings.NewReader(gpx.String()), nil)
	if err != nil {
		fmt.Println(err)
		return
	}
	p, err := hill.FromTrack(&track, hill.Options{})
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("%s: %.0f m, up %.0f m, %.1f %% half way\n", p.Name, p.LengthM(), p.AscentM(), 100*p.GradeAt(150))
	// Output:
	// Mill lane: 335 m, up 30 m, 9.0 % half way
}
