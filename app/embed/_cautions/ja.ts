import type { CautionTexts } from "./caution-in";

/** Cautions in Japanese. */
export const ja: CautionTexts = {
  "This is a DC resistance under the stated assumptions and no proof of compliance: insulation, touch voltage, fault duration and protection are for the local code and a licensed or otherwise competent engineer.":
    "これは記載の仮定のもとでの直流抵抗であり、適合の証明ではありません。絶縁、接触電圧、故障継続時間および保護については、現地の規定に従い、有資格またはそれに相当する能力のある技術者が判断してください。",
  "This is a DC resistance under the stated assumptions and no proof of compliance: ampacity, temperature rise and protection are for the local code and a licensed or otherwise competent engineer.":
    "これは記載の仮定のもとでの直流抵抗であり、適合の証明ではありません。許容電流、温度上昇および保護については、現地の規定に従い、有資格またはそれに相当する能力のある技術者が判断してください。",
  "This is a DC resistance under the stated assumptions and no proof of compliance: touch and step voltage, fault duration and protection are for the local code and a licensed or otherwise competent engineer.":
    "これは記載の仮定のもとでの直流抵抗であり、適合の証明ではありません。接触電圧、歩幅電圧、故障継続時間および保護については、現地の規定に従い、有資格またはそれに相当する能力のある技術者が判断してください。",
  "The result is a DC resistance under the stated assumptions and no proof of compliance: ampacity, temperature rise, insulation and protection are for the local code and a licensed or otherwise competent engineer.":
    "これは記載の仮定のもとでの直流抵抗であり、適合の証明ではありません。許容電流、温度上昇、絶縁および保護については、現地の規定に従い、有資格またはそれに相当する能力のある技術者が判断してください。",
  "The nominal section of a cable is a name: its resistance is fixed by the limits of its standard, not by this area.":
    "ケーブルの公称断面積は呼称です。抵抗はこの面積ではなく、その規格の限度値で決まります。",
  "Insulation: the resistance of a dielectric depends on moisture, temperature and the time under voltage; this is no proof of its strength.":
    "絶縁：誘電体の抵抗は湿気、温度、電圧印加時間によって変わります。絶縁耐力の証明ではありません。",
  "A DC resistance only: at high frequency the current leaves the core for the cladding, and the resistance is another one.":
    "直流抵抗のみです。高周波では電流が芯から被覆金属へ移り、抵抗は異なる値になります。",
  "A winding that carries current heats itself: give the temperature that it reaches.":
    "通電した巻線は自己発熱します。到達する温度を入力してください。",
  "A real contact has many small spots and films between them; this is one clean spot of known size.":
    "実際の接触には多数の小さな接触点とその間の皮膜があります。これは大きさの分かった清浄な接触点1つの場合です。",
  "The current density at the tip of a slit is high; trimmed resistors drift and fail there first.":
    "切れ込みの先端では電流密度が高く、トリミングした抵抗器はまずそこで変動し故障します。",
  "The resistivity of soil changes with moisture, temperature, season and depth, often by more than a factor of two: measure it at the site, and measure the electrode once it is built.":
    "大地の抵抗率は水分、温度、季節、深さによって変わり、2倍を超えることも珍しくありません。現地で測定し、施工後に接地極も測定してください。",
  "The conductivity varies inside the elements, so the integrals behind the bounds are estimated and the bracket is not proved.":
    "要素内で導電率が変化するため、上下限の積分は推定値であり、上下限は証明されていません。",
  "The depth lies outside 0.25 m to 2.5 m, for which IEEE Std 80 states the formula.":
    "深さが IEEE Std 80 の式の適用範囲（0.25 m～2.5 m）を外れています。",
  "So little conductor cannot enclose that area: even a ring of it takes 3.54 times the root of the area. Check area and conductor length.":
    "この導体長ではその面積を囲めません。環状でも面積の平方根の 3.54 倍が必要です。面積と導体の全長を確認してください。",
  "The grid has fewer meshes than about 4 by 4; the formula is rough there, and its bounds are wider.":
    "格子の目数が約 4×4 より少なく、式は粗くなり、上下限は広くなります。",
  "The rod is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "接地棒の長さは直径の {0} 倍しかありません。式は 10 倍以上を想定しており、ここでは上下限が広くなります。",
  "The wire is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "線の長さは直径の {0} 倍しかありません。式は 10 倍以上を想定しており、ここでは上下限が広くなります。",
  "The arm is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "腕の長さは直径の {0} 倍しかありません。式は 10 倍以上を想定しており、ここでは上下限が広くなります。",
  "The rod is only {0} diameters long: it is no longer a rod, and the value is a rough one; a hemisphere or a plate describes it better.":
    "接地棒の長さは直径の {0} 倍しかなく、もはや棒とは言えず値は粗いものです。半球または板のほうが適しています。",
  "The depth is only {0} wire diameters: so near the surface the soil is rarely uniform, and the current leaves the wire unevenly.":
    "深さは線径の {0} 倍しかありません。地表近くの土壌は均一であることが少なく、電流は線から不均一に流れ出ます。",
  "The depth is more than half of the ring's radius: the published series no longer hold there; the value is computed without them.":
    "深さが環の半径の半分を超えています。公表された級数は成り立たないため、それを使わずに計算しています。",
  "The depth is more than half of the length of an arm: the published series no longer hold there; the value is computed without them.":
    "深さが腕の長さの半分を超えています。公表された級数は成り立たないため、それを使わずに計算しています。",
  "The depth is more than half of half the length of the wire: the published series no longer hold there; the value is computed without them.":
    "深さが線の長さの半分の半分を超えています。公表された級数は成り立たないため、それを使わずに計算しています。",
  "The rods are only {0} diameters apart: they act like one thick rod, and the current leaves them on their outer sides.":
    "接地棒の間隔は直径の {0} 倍しかありません。太い1本の棒のように働き、電流は外側から流れ出ます。",
  "The rods are closer together than they are long; a wider spacing would lower the resistance.":
    "接地棒の間隔が棒の長さより狭くなっています。間隔を広げると抵抗は下がります。",
  "The wire is thicker than a tenth of the ring's diameter; the formula is meant for thin rings, and its bounds are wider here.":
    "線が環の直径の10分の1より太くなっています。式は細い環を想定しており、ここでは上下限が広くなります。",
  "Here the even current makes the value up to {0} % too high: the true resistance lies near the lower bound.":
    "ここでは電流を均一としたため、値は最大 {0} % 高めです。真の抵抗は下限の近くにあります。",
  "The width is not less than the pitch: neighbouring turns would touch, and the current would take a shorter way.":
    "幅がピッチより小さくありません。隣り合う巻きが接触し、電流は短い経路を通ります。",
  "The pitch is smaller than the wire diameter: the turns of one layer would run into each other. Give the mean pitch of all layers only if that is meant.":
    "ピッチが線径より小さく、1層の巻きが重なります。全層の平均ピッチを意図する場合だけその値を入力してください。",
  "The legs are short against their width: the long-leg formula may be off by up to {0} %.":
    "脚が幅に比べて短く、長い脚の式は最大 {0} % ずれることがあります。",
  "Steep taper: the proved bounds lie {0} % apart and the value is their middle; a field solution on the outline narrows them.":
    "テーパーが急です。証明済みの上下限は {0} % 離れており、値はその中央です。輪郭の場の解を使うと狭まります。",
  "The integral over {0} reached a relative error of about {1} only; the bounds include it.":
    "{0} に関する積分の相対誤差は約 {1} までしか下がりませんでした。上下限に含まれています。",
  "An integral over the grading met its cap; the bounds are not proved.":
    "傾斜分布の積分が打ち切りに達したため、上下限は証明されていません。",
  "The resistivity of {0} may lie between {1} and {2} of the nominal value, which the bounds do not include: {3}":
    "{0} の抵抗率は公称値の {1} から {2} の間にあり得ますが、上下限には含まれていません：{3}",
  "Extrapolated: {0} is used at {1}, but holds at {2}.":
    "外挿：{0} を {1} で使用していますが、適用温度は {2} です。",
  "Extrapolated: {0} is used at {1}, but holds from {2} to {3}.":
    "外挿：{0} を {1} で使用していますが、適用範囲は {2} から {3} までです。",
  "The dopant density falls below {0} 1/cm³, where the mobility is taken as that of light doping.":
    "不純物密度が {0} 1/cm³ を下回るところでは、低濃度の移動度を用いています。",
  "Silicon near 23 °C: the conductivity by dopant density does not follow the operating temperature.":
    "23 °C 付近のシリコン：不純物密度による導電率は動作温度に追従しません。",
  "No input has a tolerance, so the uncertainty is zero.": "公差のある入力がないため、不確かさはゼロです。",
  "The sensitivities are those of the formula; the value is that of the field solution on the nominal plan.":
    "感度係数は式によるもので、値は公称形状での場の解によるものです。",
  "The resistance is not straight over the tolerances, so first-order propagation is rough here; its range is widened to the values at their ends. monte-carlo takes the bend into account.":
    "公差の範囲で抵抗が直線的に変化しないため、一次の伝播はここでは粗く、範囲は両端の値まで広げています。モンテカルロ法は曲がりを考慮します。",
  "From {0} to {1} Ω·m by moisture, salts and grain.": "{0}～{1} Ω·m（水分、塩類、粒度による）。",
  "From {0} to {1} Ω·m by moisture and cement.": "{0}～{1} Ω·m（水分とセメントによる）。",
  "From {0} to {1} Ω·m by moisture and age.": "{0}～{1} Ω·m（水分と材齢による）。",
  "An order of magnitude: dry material, after a minute under voltage; heat, moisture and fillers lower it much.":
    "桁の目安：乾燥状態、電圧印加1分後の値。熱、湿気、充填材により大きく下がります。",
  "Drinking water runs from about {0} to {1} Ω·m by its minerals and temperature.":
    "飲料水は鉱物成分と温度により約 {0}～{1} Ω·m です。",
  "Salinities from about {0} to {1}.": "塩分はおよそ {0}～{1} です。",
  "By carbon, manganese and silicon content (common practice, no source).":
    "炭素、マンガン、けい素の含有量による（一般的な目安、出典なし）。",
  "By tin and phosphorus content; bronzes in general run from {0} to {1} % IACS.":
    "すずとりんの含有量による。青銅は一般に {0}～{1} % IACS です。",
  "Published values for the bulk alloy run from {0} to {1} µΩ·m; voids in a joint raise it.":
    "バルク合金の公表値は {0}～{1} µΩ·m です。接合部の空隙により高くなります。",
  "Extruded and moulded grades run from {0} to {1} µΩ·m, and depend on the direction (common practice, no source).":
    "押出材と成形材は {0}～{1} µΩ·m で、方向により異なります（一般的な目安、出典なし）。",
  "Sputtered films run from {0} µΩ·m (hot, annealed) to {1} µΩ·m (cold, on plastic) (common practice, no source).":
    "スパッタ膜は {0} µΩ·m（高温、アニール）から {1} µΩ·m（低温、樹脂上）です（一般的な目安、出典なし）。",
};
