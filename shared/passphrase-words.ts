/**
 * The words of passphrases: 1 024 of them, so that one stands for 10 bits and four for 40. Short,
 * common, clean, and none that sounds like another: a child can read one out and type it.
 */
const WORDS = `
acorn album almond alpine amber anchor angle ankle anvil apple apron arch arctic arena aroma arrow aspen atlas atom
attic august aunt autumn awake bacon badge bagel baker bamboo banana band banjo banner barn basil basin basket batch
beach beacon bead beak beam bean bear beaver beetle bell belt bench bike birch bird bishop blank blaze blend blink
block bloom blouse blush boat bonnet book border borrow bottle bottom bounce bowl box braid branch brass brave break
breeze brick bright brisk brook broom brown bubble bucket buckle bud buffet bugle build bulb bumper bundle bunny
burrow butter buzz cable cactus cake camel camera camp canal candle candy canoe canvas canyon cape card cargo carpet
carrot cart carve castle cat catch cave cedar cement chain chair chalk chance chapel charm chart cheer cheese cherry
chess chief chime chin chip chorus cinema circle circus city clam clap clean clear clever cliff climb clip cloak
clock cloth cloud clover club coach coal coast coat cobalt cobble cocoa coffee coil coin collar comb comet comic
common copper coral cork corn corner cosmos cotton couch county cousin cover cow crab craft crane crater crayon
cream crop crowd crown crumb crust cube cup curl curry curve cycle daily dairy daisy dance dawn day deck deep denim
depot desert desk diary dice dinner dip dish dock doctor dog doll dollar donkey door double dove dozen dragon drama
draw dream dress drill drive drum duck dusk dust eager eagle early earth east easy edge eight elbow elder elf ember
empire engine enjoy entry equal even event exit extra fabric fact falcon fall family famous fan farm father faucet
fawn feast fence fern ferry fiddle field fig figure film finch find finger fire fish five flag flame flash flat flax
float flock floor flora flute foam focus folk fond food foot forest forge fork fort forty forum fox frame free fresh
friend frog front frost fruit fudge funny future galaxy gallop game garage garden garlic garnet gate gem genie
gentle giant gift glad glade glass glide globe glory glove glow glue goat gold golf good goose grain grand grape
grass gravel gravy green grid grin grove grow guest guide guitar gull guppy gust habit hail half hammer hamper hand
happy harp hat hatch hazel head heap heart hearth heat hedge height helmet help hen herb heron hill hockey hold
holly honest honey hood hoof hoop hope horn hotel hover hug human hush husky hut ice icicle idea inch indigo ink
insect inside iris island item ivory ivy jacket jade jaw jazz jelly jersey jet jewel jigsaw job jog join joke jolly
joy juggle juice jumbo jump june jungle junior just kayak keen kelp kettle key kick kind king kiosk kit kite kitten
kiwi knee knob koala label lace ladder lady lagoon lake lamb lamp land lane larch large lark laser latch laugh
laurel lawn layer leaf leap learn ledge legend lemon lentil lesson letter lever lid light lilac lily lime link lion
list little lizard llama lobby local locket lodge log loom loop lotus lucky lunar lunch magic magnet major mallet
manor map maple marble march margin marina market mask mast match maze meadow meal medal mellow melody melon member
memory menu merry meter midday middle mild milk mill minnow mint minute mist mitten mixer moat model modern mole
moment month moon moose mosaic moss moth mother mount mouse mouth movie muffin mule museum music myth nacho name
napkin narrow nation nature navy near neat nectar nest net never new nice nickel nine noble noon north nose note
novel number nutmeg oak oasis oat ocean ocelot octave offer office olive onion opal open opera orange orbit orchid
order organ origin otter ounce oval oven owl owner oxygen oyster paddle page paint palace palm panda panel paper
parade parcel park parrot party pasta pastel pastry patch path patio paw peach peanut pearl pebble pedal pen pencil
people pepper perch person petal phone photo piano pickle picnic pie pigeon pillow pine pink pint pizza place plan
planet plank plant plate play plenty plot plus pocket point polar polish pollen polo pond pool poplar poppy porch
port potato pouch powder pretty print prism prize proof proud puddle puffin pump puppet puppy purple purse puzzle
quail quarry quart queen quest quick quill quiz rabbit race radar radio radish raft rail raisin rally ranch range
rapid reach read ready record reef relay rescue rest reward rhyme ribbon rice riddle ride ridge ring ripple rise
river robin robot rock rocket rodeo roll roof room rope rose round rover rowan royal ruby rudder rug rugby ruler run
runner rush saddle safari safe sage salad salmon salt salute sand sandal save scale scarf school scoop score scout
screen script scroll seal season seat second secret seed seven shade shadow shape share sharp sheep sheet shelf
shell shine ship shirt shoe shop short shovel show shrimp side signal silk silver simple sing sister six sketch ski
skill skirt sled sleep sleeve slide slope smile smooth snack snail snow soap soccer socket soda sofa soil solar solo
song soup source south space spark speak speed spell spice spiral spire splash spoon sport spot spray spring sprout
square squash stable stage stamp star start statue steam stem step stereo stone store storm stove straw stream
street stripe studio style sugar suit summer summit sunny supper swan swift swim swing switch symbol syrup system
table tablet talent tango tape tart taste taxi teal team temple ten tennis tent term test thank theme thing thirty
three ticket tidy tiger tile timber time tiny tip title toast today toffee tomato tool top torch toucan tour tower
town toy track trade trail train tray tree trek trend trial trick trip trophy trout truck trunk try tulip tunnel
turkey turn turtle twelve twenty twig twin twist type uncle useful vacuum van velvet verse vest video view villa
vine violet visit vocal voice volume voyage waffle wagon walk wall walnut walrus waltz warm watch water wave wax
weave west wheat wheel whisk willow win wind window wing winner winter wizard wolf wonder wool word world wrist
yacht yard year yellow yoga yonder young zebra zero zigzag zip zone zoo zoom
`;

/** The words, sorted, each once; 3 to 6 letters a to z. */
export const PASSPHRASE_WORDS: readonly string[] = WORDS.trim().split(/\s+/);
